import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import { type Bench } from '#shared/contract/bench';

/** Whose file it is: one of the racks set up for the part, or none of them. */
@Component({
  selector: 'qr-rack-choice',
  imports: [MatFormFieldModule, MatSelectModule],
  template: `
    @if (racks().length > 0) {
      <mat-form-field>
        <mat-label>Rack</mat-label>
        <mat-select placeholder="None of these" [value]="rackId()" (valueChange)="chosen.emit($event)">
          <mat-option [value]="null">None of these</mat-option>
          @for (rack of racks(); track rack.id) {
            <mat-option [value]="rack.id">{{ rack.name }}</mat-option>
          }
        </mat-select>
        <mat-hint>What its columns hold is remembered with it</mat-hint>
      </mat-form-field>
    } @else {
      <p class="small quiet">No rack is set up for this part; what you say of the columns is not remembered.</p>
    }
  `,
  styles: `
    :host {
      display: grid;
      margin-bottom: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RackChoice {
  readonly racks = input.required<Bench['racks']>();
  readonly rackId = input.required<number | null>();
  readonly chosen = output<number | null>();
}
