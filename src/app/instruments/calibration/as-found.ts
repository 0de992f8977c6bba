import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { AS_FOUND_TITLES, type Calibration } from '#shared/contract/calibrations';
import { VerdictChip } from '../../ui/marks/verdict-chip';
import { type VerdictLook } from '../../ui/verdict-look';

const LOOKS: Readonly<Record<Calibration['asFound'], VerdictLook>> = {
  'in-tolerance': 'ok',
  'out-of-tolerance': 'nok',
  'not-recorded': 'open',
};

/** How a calibration found the instrument, before any adjustment. */
@Component({
  selector: 'qr-as-found',
  imports: [VerdictChip],
  template: `<qr-verdict-chip [look]="look()" [word]="titles[of()]" />`,
  styles: `
    qr-verdict-chip {
      font: 500 13px/18px var(--qr-sans);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AsFound {
  readonly of = input.required<Calibration['asFound']>();

  protected readonly titles = AS_FOUND_TITLES;
  protected readonly look = computed(() => LOOKS[this.of()]);
}
