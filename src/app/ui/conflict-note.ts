import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { VerdictMark } from './marks/verdict-mark';

/** A field that two people gave different values. */
export interface Difference {
  readonly label: string;
  readonly mine: string;
  readonly theirs: string;
}

/** Somebody else saved first: both values side by side, and the choice between them. */
@Component({
  selector: 'qr-conflict-note',
  imports: [MatButton, VerdictMark],
  templateUrl: './conflict-note.html',
  styleUrl: './conflict-note.scss',
  host: { role: 'alert' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConflictNote {
  /** Names the record at the start of a sentence: "This supplier". */
  readonly what = input.required<string>();
  readonly differences = input.required<readonly Difference[]>();
  /** Keep what was typed; the next save replaces the other person's values. */
  readonly keepMine = output();
  readonly takeTheirs = output();
}
