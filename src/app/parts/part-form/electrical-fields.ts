import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import { TOPOLOGIES, TOPOLOGY_TITLES } from '#shared/contract/parts';
import { QuantityField } from '../../ui/quantity-field/quantity-field';
import { type PartFields } from './part-fields';

/** The electrical model: ratings, then what the rectifier's ripple follows from. */
@Component({
  selector: 'qr-electrical-fields',
  imports: [MatFormFieldModule, MatSelectModule, QuantityField, ReactiveFormsModule],
  templateUrl: './electrical-fields.html',
  styles: `
    :host {
      display: grid;
      gap: 14px;
    }
    h2 {
      margin-top: 6px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ElectricalFields {
  readonly model = input.required<PartFields['model']>();
  /** Whether the circuit rectifies the mains with a filter capacitor behind it. */
  readonly rectifies = input.required<boolean>();

  protected readonly topologies = TOPOLOGIES.map((topology) => ({ topology, title: TOPOLOGY_TITLES[topology] }));
}
