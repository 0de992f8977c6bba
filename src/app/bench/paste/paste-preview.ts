import { ChangeDetectionStrategy, Component, computed, input, signal } from '@angular/core';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { readingDigits } from '../../ui/values/reading-text';
import { LOOK_WORDS, lookOf } from '../../ui/verdict-look';
import { rowWindow } from '../bench-page/measuring-grid/row-window';
import { type CheckedCell, type CheckedPaste } from './checked-paste';

const ROW = 26;
const HEIGHT = 260;

/** The pasted block on its units and characteristics, each cell as it was read; only the rows in view are drawn. */
@Component({
  selector: 'qr-paste-preview',
  imports: [VerdictMark],
  templateUrl: './paste-preview.html',
  styleUrl: './paste-preview.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PastePreview {
  readonly paste = input.required<CheckedPaste>();

  protected readonly scrolled = signal(0);
  private readonly window = computed(() =>
    rowWindow({ scrolled: this.scrolled(), height: HEIGHT, rowHeight: ROW, rows: this.paste().rows.length }),
  );
  protected readonly above = computed(() => this.window().from * ROW);
  protected readonly below = computed(() => (this.paste().rows.length - this.window().to) * ROW);
  protected readonly rows = computed(() =>
    this.paste()
      .rows.slice(this.window().from, this.window().to)
      .map(({ unit, cells, verdict }) => ({
        unit,
        cells: this.paste().columns.map(({ key }) => {
          const cell = cells.get(key);
          return { key, ...(cell && shownCell(cell, verdict.characteristics.get(key)?.verdict)) };
        }),
      })),
  );
}

function shownCell(cell: CheckedCell, verdict: string | undefined) {
  const { characteristic, reading, state, why, text } = cell;
  const look = state === 'fault' ? 'fault' : state === 'question' ? 'hold' : lookOf(verdict);
  const words = look === 'fault' || state === 'skipped' ? why : LOOK_WORDS[look];
  const value = reading?.value;
  const read =
    typeof value === 'number' && characteristic.kind !== 'attribute'
      ? readingDigits(value, characteristic.unit, characteristic.decimals)
      : typeof value === 'boolean'
        ? value
          ? 'Pass'
          : 'Fail'
        : text;
  return { look, state, read, words: why === '' ? words : `${words} ${why}` };
}
