import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import { INSTRUMENT_KIND_TITLES } from '#shared/contract/instruments';
import { InstrumentDue } from '../../../ui/marks/instrument-due';
import { InstrumentChoice } from '../../sheet/instrument-choice';

/** Which instrument takes the readings; one past its calibration date is shown and cannot be chosen. */
@Component({
  selector: 'qr-instrument-field',
  imports: [InstrumentDue, MatFormFieldModule, MatSelectModule],
  template: `
    <span class="label" id="instrument-kind">{{ title() }}</span>
    <mat-form-field>
      <mat-select
        aria-labelledby="instrument-kind"
        [value]="choice.chosen()?.id"
        placeholder="Choose"
        (valueChange)="choose($event)"
      >
        <mat-select-trigger>
          @if (choice.chosen(); as chosen) {
            <span class="option"
              ><b class="mono">{{ chosen.assetNumber }}</b> <qr-instrument-due [due]="chosen.calibrationDue"
            /></span>
          }
        </mat-select-trigger>
        @for (instrument of choice.offered(); track instrument.id) {
          <mat-option [value]="instrument.id" [disabled]="!instrument.usable">
            <span class="option"
              ><b class="mono">{{ instrument.assetNumber }}</b> {{ instrument.description }}
              <qr-instrument-due [due]="instrument.calibrationDue"
            /></span>
          </mat-option>
        } @empty {
          <mat-option disabled>None in service</mat-option>
        }
      </mat-select>
    </mat-form-field>
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: max-content minmax(0, 1fr);
      gap: 12px;
      align-items: center;
    }
    .option {
      display: flex;
      align-items: center;
      gap: 10px;
      font: var(--qr-t-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InstrumentField {
  protected readonly choice = inject(InstrumentChoice);
  protected readonly title = computed(() => {
    const kind = this.choice.kind();
    return kind === null ? 'Instrument' : INSTRUMENT_KIND_TITLES[kind];
  });

  protected choose(id: number): void {
    const instrument = this.choice.offered().find((each) => each.id === id);
    if (instrument !== undefined) this.choice.choose(instrument);
  }
}
