import { ChangeDetectionStrategy, Component, computed, ElementRef, inject, input, output } from '@angular/core';
import { cellAt, cellName, columnOf, type StudyCell } from '#shared/gauge-study/study-cell';
import { ScrollRegion } from '../../ui/scroll-region';
import { type ReadingsDraft } from './readings-draft';

/** A block of a spreadsheet that was set into a cell. */
export interface PastedBlock {
  readonly from: StudyCell;
  readonly text: string;
}

/** Where a key goes from a cell: rows down, columns to the right. */
const STEPS: Readonly<Record<string, readonly [down: number, right: number]>> = {
  ArrowUp: [-1, 0],
  ArrowDown: [1, 0],
  Enter: [1, 0],
  ArrowLeft: [0, -1],
  ArrowRight: [0, 1],
};

/**
 * The table into which the readings of a study are typed: parts down, the trials of each person to the right. Enter and the
 * arrows up and down change the row; left and right leave a cell where its text ends; Tab goes from cell to cell.
 */
@Component({
  selector: 'qr-readings-grid',
  imports: [ScrollRegion],
  templateUrl: './readings-grid.html',
  styleUrl: './readings-grid.scss',
  host: { '(input)': 'typed($event)', '(keydown)': 'walk($event)', '(paste)': 'paste($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadingsGrid {
  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  readonly draft = input.required<ReadingsDraft>();
  readonly pasted = output<PastedBlock>();

  protected readonly study = computed(() => this.draft().study);
  protected readonly trials = computed(() => Array.from({ length: this.study().trials }, (_, nth) => nth));

  /** Puts the cursor into a cell. */
  focus(cell: StudyCell): void {
    this.inputAt(cell.part, columnOf(this.study(), cell))?.select();
  }

  protected nameOf(part: number, person: number, trial: number): string {
    return cellName(this.study(), { part, person, trial });
  }

  protected typed(event: Event): void {
    const found = this.cellOf(event.target);
    if (found) this.draft().type(found.cell, found.input.value);
  }

  protected walk(event: KeyboardEvent): void {
    const found = this.cellOf(event.target);
    const step = STEPS[event.key];
    if (!found || !step || event.altKey || event.ctrlKey || event.metaKey || !leaves(event, found.input)) return;
    const back = event.key === 'Enter' && event.shiftKey ? -1 : 1;
    const next = this.inputAt(found.cell.part + step[0] * back, columnOf(this.study(), found.cell) + step[1]);
    event.preventDefault();
    next?.select();
  }

  /** What holds a tab or a line break is a block of cells; all else is text for the cell itself. */
  protected paste(event: ClipboardEvent): void {
    const found = this.cellOf(event.target);
    const text = event.clipboardData?.getData('text/plain') ?? '';
    if (!found || !/[\t\r\n]/.test(text)) return;
    event.preventDefault();
    this.pasted.emit({ from: found.cell, text });
  }

  private cellOf(target: EventTarget | null): { input: HTMLInputElement; cell: StudyCell } | null {
    if (!(target instanceof HTMLInputElement)) return null;
    const { row, column } = target.dataset;
    if (row === undefined || column === undefined) return null;
    return { input: target, cell: cellAt(this.study(), Number(row), Number(column)) };
  }

  private inputAt(row: number, column: number): HTMLInputElement | null {
    return this.element.querySelector(`input[data-row="${String(row)}"][data-column="${String(column)}"]`);
  }
}

/** Left and right move within the text of a cell first. */
function leaves({ key }: KeyboardEvent, { selectionStart, selectionEnd, value }: HTMLInputElement): boolean {
  if (key === 'ArrowLeft') return selectionStart === 0 && (selectionEnd === 0 || selectionEnd === value.length);
  return key !== 'ArrowRight' || selectionEnd === value.length;
}
