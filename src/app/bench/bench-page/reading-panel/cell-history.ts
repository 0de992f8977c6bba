import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { REPEAT_REASON_TITLES } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { MomentPipe } from '../../../ui/values/moment-pipe';
import { type BenchReading } from '../../sheet/bench-reading';
import { BenchSheet } from '../../sheet/bench-sheet';
import { readingWords } from '../../sheet/reading-words';

/** The readings of one cell, each with who took it, when and with what; repeats with their reason. */
@Component({
  selector: 'qr-cell-history',
  imports: [MomentPipe],
  template: `
    @for (line of lines(); track line.id) {
      <li [class.gone]="line.withdrawn">
        <span class="num">{{ line.value }}</span>
        <span>
          {{ line.takenAt | moment }}{{ line.by }}
          @if (line.why) {
            <span class="why">{{ line.why }}</span>
          }
        </span>
      </li>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 2px;
      font: var(--qr-t-small);
      color: var(--qr-ink-2);
    }
    li {
      display: flex;
      gap: 10px;
      align-items: baseline;
      list-style: none;
    }
    .num {
      color: var(--qr-ink);
    }
    .gone .num {
      color: var(--qr-ink-3);
      text-decoration: line-through;
    }
    .why {
      display: block;
      overflow-wrap: anywhere;
    }
  `,
  host: { role: 'list', 'aria-label': 'Readings of this cell' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CellHistory {
  private readonly sheet = inject(BenchSheet);

  readonly readings = input.required<readonly BenchReading[]>();
  readonly characteristic = input.required<Characteristic>();

  protected readonly lines = computed(() =>
    this.readings().map((reading) => ({
      id: reading.id,
      value: readingWords(reading, this.characteristic()),
      takenAt: reading.takenAt,
      withdrawn: reading.withdrawn,
      by: this.byWhom(reading),
      why: this.whyOf(reading),
    })),
  );

  private byWhom({ takenBy, instrumentId, state, withdrawn }: BenchReading): string {
    const instrument = this.sheet.bench().instruments.find(({ id }) => id === instrumentId);
    const parts = [takenBy ?? 'rack', instrument?.assetNumber, state === 'waiting' ? 'not sent yet' : undefined];
    const taken = withdrawn ? ['taken back'] : [];
    return ['', ...parts.filter((part) => part !== undefined), ...taken].join(', ');
  }

  private whyOf({ repeat, note, entry }: BenchReading): string {
    const repeated = repeat === null ? '' : `Repeat: ${REPEAT_REASON_TITLES[repeat.reason].toLowerCase()}`;
    const failed = entry?.kind === 'attribute' ? entry.reason : '';
    return [repeated, repeat?.note ?? '', failed, note].filter((part) => part !== '').join('. ');
  }
}
