import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { REPEAT_REASON_TITLES } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { MomentPipe } from '../../../ui/values/moment-pipe';
import { uncertaintyText } from '../../../ui/values/uncertainty-text';
import { type BenchReading } from '../../sheet/bench-reading';
import { BenchSheet } from '../../sheet/bench-sheet';
import { rangeById } from '../../sheet/reading-range';
import { readingWords } from '../../sheet/reading-words';
import { WarmUp } from '../warm-up';
import { answerWords } from './answer-words';
import { entryWords } from '../../../ui/values/entry-words';

/** The readings of one cell, each as it was typed, with who took it, when and with what; repeats with their reason. */
@Component({
  selector: 'qr-cell-history',
  imports: [MomentPipe],
  template: `
    @for (line of lines(); track line.id) {
      <li [class.gone]="line.withdrawn">
        <span class="num">{{ line.value }}</span>
        <span>
          {{ line.takenAt | moment }}{{ line.by }}
          @for (why of line.why; track $index) {
            <span class="why">{{ why }}</span>
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
      flex: none;
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
  private readonly warmUp = inject(WarmUp);

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

  private byWhom(reading: BenchReading): string {
    const { takenBy, rack, state, withdrawn } = reading;
    const parts = [takenBy ?? rack ?? 'rack', this.withWhat(reading)];
    if (state === 'waiting') parts.push('not sent yet');
    if (withdrawn) parts.push('taken back');
    return ['', ...parts.filter((part) => part !== '')].join(', ');
  }

  private withWhat({ instrumentId, rangeId }: BenchReading): string {
    const { instruments } = this.sheet.bench();
    const instrument = instruments.find(({ id }) => id === instrumentId)?.assetNumber ?? '';
    return `${instrument} ${rangeById(instruments, rangeId)?.name ?? ''}`.trim();
  }

  private whyOf(reading: BenchReading): string[] {
    const { repeat, note, entry, question, takenAt, withdrawn } = reading;
    const repeated = repeat === null ? '' : `Repeat: ${REPEAT_REASON_TITLES[repeat.reason].toLowerCase()}`;
    const reasons = [
      [entryWords(entry), this.uncertainty(reading)],
      [repeated, repeat?.note ?? ''],
      [entry?.kind === 'attribute' ? entry.reason : ''],
      [answerWords(question, this.characteristic())],
      [withdrawn ? '' : this.warmUp.wordsAt(takenAt)],
      [note],
    ];
    return reasons.map((parts) => parts.filter((part) => part !== '').join(', ')).filter((line) => line !== '');
  }

  private uncertainty({ expandedUncertainty }: BenchReading): string {
    const characteristic = this.characteristic();
    if (expandedUncertainty === null || characteristic.kind === 'attribute') return '';
    return uncertaintyText(expandedUncertainty, characteristic.unit);
  }
}
