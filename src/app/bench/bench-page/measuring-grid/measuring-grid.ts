import {
  afterNextRender,
  ApplicationRef,
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  ElementRef,
  inject,
  Injector,
  input,
  output,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { type BenchCommand, benchCommand } from '#shared/bench/bench-key';
import { BenchSettings } from '../../bench-settings';
import { BenchCursor } from '../../sheet/bench-cursor';
import { BenchSheet } from '../../sheet/bench-sheet';
import { ReadingDraft } from '../../sheet/reading-draft';
import { gridLayout, UNIT, VERDICT } from './grid-layout';
import { GridFoot } from './grid-foot';
import { GridHead } from './grid-head';
import { GridRow } from './grid-row';
import { rowWindow } from './row-window';
import { viewSize } from './view-size';

/** All readings of the sample. One tab stop; the focus roves, and only the rows in view and some around them are drawn. */
@Component({
  selector: 'qr-measuring-grid',
  imports: [GridFoot, GridHead, GridRow],
  templateUrl: './measuring-grid.html',
  styleUrl: './measuring-grid.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MeasuringGrid {
  private readonly application = inject(ApplicationRef);
  private readonly injector = inject(Injector);
  private readonly settings = inject(BenchSettings);
  private readonly draft = inject(ReadingDraft);
  protected readonly sheet = inject(BenchSheet);
  protected readonly cursor = inject(BenchCursor);

  /** Who has just filled which cells: initials by characteristic, by unit. */
  readonly fresh = input<ReadonlyMap<number, ReadonlyMap<string, string>>>(new Map());
  /** What a key asks for beyond moving about. */
  readonly asked = output<BenchCommand>();
  /** Text put in from the clipboard. */
  readonly pasted = output<string>();

  private readonly scroller = viewChild.required<ElementRef<HTMLElement>>('scroller');
  private readonly head = viewChild.required<GridHead, ElementRef<HTMLElement>>(GridHead, { read: ElementRef });
  private readonly foot = viewChild.required<GridFoot, ElementRef<HTMLElement>>(GridFoot, { read: ElementRef });
  private readonly size = viewSize(this.scroller);
  private readonly scrolled = signal(0);

  protected readonly layout = computed(() => gridLayout(this.cursor.columns(), this.size().width));
  protected readonly rowHeight = computed(() => this.size().row);
  private readonly window = computed(
    () =>
      rowWindow({
        scrolled: this.scrolled(),
        height: this.size().height,
        rowHeight: this.rowHeight(),
        rows: this.sheet.records().length,
      }),
    { equal: (one, other) => one.from === other.from && one.to === other.to },
  );
  protected readonly offset = computed(() => this.window().from * this.rowHeight());
  protected readonly rows = computed(() => {
    const { unit, key } = this.cursor.at();
    const typed = this.draft.preview();
    return this.sheet
      .records()
      .slice(this.window().from, this.window().to)
      .map((record) => {
        const current = record.unit === unit;
        const verdict = (current && typed) || this.sheet.verdictOf(record);
        const fresh = this.fresh().get(record.unit) ?? null;
        return { record, verdict, fresh, focusKey: current ? key : null, typedKey: current && typed ? key : null };
      });
  });
  protected readonly armed = this.draft.armed;
  /** The focus is on the grid itself while the row in focus is scrolled out of view. */
  protected readonly roving = computed(() => this.rows().some(({ focusKey }) => focusKey !== null));

  constructor() {
    effect(() => {
      this.cursor.at();
      untracked(() => afterNextRender(() => this.reveal(), { injector: this.injector }));
    });
  }

  /**
   * Puts the focus on the cell where the bench stands, at once: the next key may come before the next frame, as from a
   * scanner or a fast typist, and must find this cell. Not to be called while a change is being drawn.
   */
  focusCell(): void {
    this.application.tick();
    this.reveal();
    // Revealing may have scrolled the row in focus into the window of drawn rows.
    this.application.tick();
    const cell = this.cell();
    if (cell === null) return;
    this.revealAcross(cell);
    cell.focus({ preventScroll: true });
  }

  protected scroll(): void {
    this.scrolled.set(this.scroller().nativeElement.scrollTop);
  }

  protected press(event: KeyboardEvent): void {
    const { key, ctrlKey, metaKey, shiftKey, altKey } = event;
    const press = { key, ctrl: ctrlKey || metaKey, shift: shiftKey, alt: altKey };
    const command = benchCommand(press, this.settings.letters());
    if (command === null || !this.obey(command)) return;
    event.preventDefault();
    event.stopPropagation();
  }

  /** False for a key that is left to the browser. */
  private obey(command: BenchCommand): boolean {
    const walks = command.does === 'move' || command.does === 'next' || command.does === 'previous';
    if (!walks) {
      this.asked.emit(command);
      return true;
    }
    if (!this.draft.mayLeave()) return true;
    if (command.does === 'move') this.cursor.move(command.move);
    else if (!this.cursor.step(command.does)) return false;
    this.focusCell();
    return true;
  }

  protected paste(event: ClipboardEvent): void {
    const text = event.clipboardData?.getData('text/plain') ?? '';
    if (text === '') return;
    event.preventDefault();
    this.pasted.emit(text);
  }

  protected choose(unit: number, key: string): void {
    const { at } = this.cursor;
    if ((unit !== at().unit || key !== at().key) && this.draft.mayLeave()) this.cursor.choose(unit, key);
  }

  private cell(): HTMLElement | null {
    return this.scroller().nativeElement.querySelector('qr-grid-row.current .focused');
  }

  /** Scrolls the row in focus between the head and the summary, with two rows around it in view. */
  private reveal(): void {
    const view = this.scroller().nativeElement;
    const row = this.rowHeight();
    const top = (this.cursor.at().unit - 1) * row;
    const room = view.clientHeight - this.head().nativeElement.offsetHeight - this.foot().nativeElement.offsetHeight;
    const around = Math.min(2 * row, Math.max((room - row) / 2, 0));
    if (top - around < view.scrollTop) view.scrollTop = top - around;
    else if (top + row + around > view.scrollTop + room) view.scrollTop = top + row + around - room;
    this.scroll();
  }

  /** Scrolls a cell sideways between the two columns that stay in place. */
  private revealAcross(cell: HTMLElement): void {
    const view = this.scroller().nativeElement;
    const right = cell.offsetLeft + cell.offsetWidth + VERDICT;
    if (cell.offsetLeft - UNIT < view.scrollLeft) view.scrollLeft = cell.offsetLeft - UNIT;
    else if (right > view.scrollLeft + view.clientWidth) view.scrollLeft = right - view.clientWidth;
  }
}
