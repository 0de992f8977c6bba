import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { BenchCursor } from '../../sheet/bench-cursor';
import { PlausibilityCheck } from '../../sheet/plausibility-check';
import { DeskCommands } from '../desk-commands';
import { UnitRulings } from '../unit-rulings';

/** The steps a cell offers, for those who do not use the keys. */
@Component({
  selector: 'qr-cell-actions',
  imports: [MatButton],
  template: `
    @if (keeps() && measured() && !check.asking()) {
      <button type="button" matButton="filled" (click)="commands.keep()">
        Keep reading <kbd aria-hidden="true">Enter</kbd>
      </button>
    }
    <button type="button" [matButton]="look()" (click)="commands.repeat()">Repeat</button>
    <button type="button" [matButton]="look()" (click)="commands.note()">Note</button>
    <button type="button" [matButton]="look()" (click)="commands.setAside()">
      {{ cursor.record().setAside === null ? 'Set aside' : 'Take back' }}
    </button>
    @if (rulings.offered()) {
      <button type="button" [matButton]="look()" (click)="commands.rule()">Rule on unit</button>
    }
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      gap: 8px 4px;
      align-items: center;
    }
    button {
      min-width: 0;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CellActions {
  protected readonly cursor = inject(BenchCursor);
  protected readonly commands = inject(DeskCommands);
  protected readonly rulings = inject(UnitRulings);
  protected readonly check = inject(PlausibilityCheck);

  /** Whether the button that keeps the reading is among them; beside the number pad it is not. */
  readonly keeps = input(true);

  protected readonly look = computed(() => (this.keeps() ? 'text' : 'outlined'));
  protected readonly measured = computed(() => this.cursor.stop().characteristic.kind === 'measured');
}
