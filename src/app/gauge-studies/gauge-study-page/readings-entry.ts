import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal, viewChild } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatSnackBar } from '@angular/material/snack-bar';
import { studyBlock } from '#shared/gauge-study/study-block';
import { type PlacedText } from '#shared/gauge-study/study-cell';
import { type LineFault, studyFile } from '#shared/gauge-study/study-file';
import { Mark } from '../../ui/marks/mark';
import { MessageNote } from '../../ui/states/message-note';
import { cellText, type CellFault, type ReadingsDraft } from './readings-draft';
import { type PastedBlock, ReadingsGrid } from './readings-grid';

/** Faults told at most; the rest are counted. */
const TOLD = 12;
/** No file of readings of one study is larger. */
const LARGEST_FILE = 2_000_000;

/** A file that was read, with what is wrong in it. */
interface ReadFile {
  name: string;
  faults: readonly LineFault[];
}

/** Where the readings of an open study are typed, set in from a spreadsheet, or read from a file, and saved. */
@Component({
  selector: 'qr-readings-entry',
  imports: [Mark, MatButton, MessageNote, ReadingsGrid],
  templateUrl: './readings-entry.html',
  styleUrl: './readings-entry.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadingsEntry {
  private readonly snackBar = inject(MatSnackBar);
  private readonly grid = viewChild.required(ReadingsGrid);

  readonly draft = input.required<ReadingsDraft>();
  readonly busy = input(false);
  readonly said = input<readonly string[]>([]);
  readonly save = output();

  protected readonly refused = signal('');
  protected readonly file = signal<ReadFile | null>(null);
  protected readonly told = TOLD;
  protected readonly needed = computed(() => this.draft().study.needed);
  protected readonly faults = computed(() => this.draft().faults());

  protected goTo({ cell }: CellFault): void {
    this.grid().focus(cell);
  }

  protected paste({ from, text }: PastedBlock): void {
    const block = studyBlock(text, from, this.draft().study);
    this.refused.set(block.state === 'refused' ? block.message : '');
    if (block.state === 'placed') this.place(block.texts);
  }

  protected async readFile(chosen: HTMLInputElement): Promise<void> {
    const [file] = chosen.files ?? [];
    if (!file) return;
    this.refused.set('');
    this.file.set(null);
    if (file.size > LARGEST_FILE) this.refused.set(`${file.name} is far larger than the readings of a study.`);
    else this.takeFile(file.name, await file.text());
    chosen.value = '';
  }

  private takeFile(name: string, text: string): void {
    const { study } = this.draft();
    const show = (value: number) => cellText(value, study);
    const { texts, faults } = studyFile(text, study, { unit: study.unit, show });
    this.file.set(faults.length > 0 ? { name, faults } : null);
    if (texts.length > 0) this.place(texts);
  }

  private place(texts: readonly PlacedText[]): void {
    const draft = this.draft();
    const before = draft.place(texts);
    const count = texts.length === 1 ? '1 reading' : `${String(texts.length)} readings`;
    this.snackBar
      .open(`${count} placed, not saved yet`, 'Undo')
      .onAction()
      .subscribe(() => draft.place(before));
  }
}
