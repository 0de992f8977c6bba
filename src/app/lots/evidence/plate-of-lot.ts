import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { VerdictPlate } from '../../ui/verdict-plate/verdict-plate';
import { type LotPlate, plateTime } from './lot-plate';

/** A lot's verdict plate with its number, time, reason and stamp. */
@Component({
  selector: 'qr-plate-of-lot',
  imports: [VerdictPlate],
  template: `
    <qr-verdict-plate
      [variant]="plate().variant"
      [word]="plate().word"
      [topLeft]="number()"
      [topRight]="time()"
      [bottomLeft]="plate().reason"
      [bottomRight]="plate().stamp"
      [animated]="animated()"
    />
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlateOfLot {
  readonly number = input.required<string>();
  readonly plate = input.required<LotPlate>();
  readonly animated = input(false);

  protected readonly time = computed(() => plateTime(this.plate().at));
}
