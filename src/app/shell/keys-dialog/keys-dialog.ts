import { ChangeDetectionStrategy, Component } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialogModule } from '@angular/material/dialog';

const EVERYWHERE = [
  { keys: ['/'], does: 'Find a lot, part, supplier, certificate or nonconformance' },
  { keys: ['Alt', '1 to 6'], does: 'Go to a station: arrivals, bench, decision, released, on hold, trends' },
  { keys: ['?'], does: 'Show these keys' },
];
const ARRIVALS = [
  { keys: ['R'], does: 'Receive a lot' },
  { keys: ['Up', 'Down'], does: 'Choose a lot of the queue' },
  { keys: ['Enter'], does: 'Start the inspection of the chosen lot' },
];
const BENCH = [
  { keys: ['0 to 9'], does: 'Start or replace the reading' },
  { keys: ['Enter'], does: 'Keep it, go to the next unit; a nonconforming reading needs it twice' },
  { keys: ['Tab'], does: 'Next characteristic; with Shift the one before' },
  { keys: ['Arrows', 'Home', 'End', 'PgUp', 'PgDn'], does: 'Move in the grid' },
  { keys: ['P', 'F'], does: 'Pass or fail an attribute' },
  { keys: ['F2'], does: 'Take the offered correction, else edit the reading' },
  { keys: ['1 to 5'], does: 'At a question: why the reading is kept all the same; Enter keeps it' },
  { keys: ['Esc'], does: 'Undo the edit; again leaves the grid' },
  { keys: ['R'], does: 'Repeat a reading, with a reason' },
  { keys: ['H'], does: 'Set the unit aside, with a reason' },
  { keys: ['N'], does: 'Note on the reading' },
  { keys: ['C'], does: 'Conditions the lot is measured under' },
  { keys: ['Ctrl', 'V'], does: 'Paste readings from a spreadsheet, from the cell in focus on' },
  { keys: ['Ctrl', 'Z'], does: 'Take the last kept reading back; it stays on record' },
];

/** All keys of the product in one list. */
@Component({
  selector: 'qr-keys-dialog',
  imports: [MatButton, MatDialogModule],
  template: `
    <h2 mat-dialog-title>Keys</h2>
    <mat-dialog-content>
      @for (group of groups; track group.title) {
        <h3>{{ group.title }}</h3>
        <dl class="kv">
          @for (key of group.keys; track key.does) {
            <dt>
              @for (cap of key.keys; track cap) {
                <kbd>{{ cap }}</kbd>
              }
            </dt>
            <dd>{{ key.does }}</dd>
          }
        </dl>
      }
    </mat-dialog-content>
    <mat-dialog-actions>
      <button type="button" matButton mat-dialog-close>Close</button>
    </mat-dialog-actions>
  `,
  styles: `
    h3 {
      margin: 12px 0 6px;
      color: var(--qr-ink);
    }
    dt {
      display: flex;
      flex-wrap: wrap;
      align-items: flex-start;
      gap: 4px;
      max-width: 150px;
    }
    dd {
      font-weight: 400;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class KeysDialog {
  protected readonly groups = [
    { title: 'Everywhere', keys: EVERYWHERE },
    { title: 'In arrivals', keys: ARRIVALS },
    { title: 'At the bench', keys: BENCH },
  ];
}
