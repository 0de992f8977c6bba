import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { ClassCount } from '../../ui/tally/class-count';
import { Tally } from '../../ui/tally/tally';
import { CountPipe } from '../../ui/values/count-pipe';
import { BenchCursor } from '../sheet/bench-cursor';
import { BenchSheet } from '../sheet/bench-sheet';

/** The sample at a glance and what each group still allows. */
@Component({
  selector: 'qr-sample-overview',
  imports: [ClassCount, CountPipe, Tally],
  template: `
    <div class="tally">
      <div class="head">
        <span class="label">Sample</span>
        <span class="num"
          ><b>{{ sheet.judgedUnits() | count }}</b
          >&ngsp;<span class="caption">of {{ sheet.records().length | count }} judged</span></span
        >
      </div>
      <qr-tally [states]="sheet.states()" [current]="cursor.at().unit - 1" [axis]="true" [note]="note()" />
    </div>
    @for (each of groups(); track each.group.key) {
      <qr-class-count
        [of]="each.group.class"
        [found]="each.found"
        [acceptance]="each.group.acceptance"
        [rejection]="each.group.rejection"
        [undecided]="each.undecided"
        [note]="each.note"
      />
    }
  `,
  styleUrl: './sample-overview.scss',
  host: { class: 'sheet', '[class.many]': 'groups().length > 4', '[class.four]': 'groups().length > 3' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SampleOverview {
  protected readonly sheet = inject(BenchSheet);
  protected readonly cursor = inject(BenchCursor);

  /** Two groups of one class are told apart by their level. */
  protected readonly groups = computed(() =>
    this.sheet.groups().map((each, _, all) => {
      const alike = all.filter(({ group }) => group.class === each.group.class).length > 1;
      return { ...each, note: alike ? `${each.group.level}, n ${each.group.sampleSize}` : '' };
    }),
  );
  protected readonly note = computed(() =>
    this.sheet
      .groups()
      .map(({ group, found, moreToReject }) => `${group.class} ${found} found, ${moreToReject} more to reject`)
      .join(', '),
  );
}
