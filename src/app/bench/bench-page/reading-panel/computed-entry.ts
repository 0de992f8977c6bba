import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Characteristic } from '#shared/contract/plans';
import { FORMULAS } from '#shared/measurement/formula';
import { displayUnit } from '#shared/quantities/display-unit';
import { readingDigits } from '../../../ui/values/reading-text';

/** A characteristic the program computes: its value, and the readings it comes from. */
@Component({
  selector: 'qr-computed-entry',
  template: `
    <p class="quiet">{{ formula().title }}, computed from {{ sources() }}. Nothing to type.</p>
    <output class="result" aria-live="off">
      <b [class.empty]="value() === null">{{ digits() }}</b>
      <span class="unit">{{ unitLabel() }}</span>
    </output>
  `,
  styleUrl: './direct-entry.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComputedEntry {
  readonly characteristic = input.required<Extract<Characteristic, { kind: 'computed' }>>();
  readonly value = input.required<number | null>();
  /** Names of the plan's characteristics by key. */
  readonly names = input.required<ReadonlyMap<string, string>>();

  protected readonly formula = computed(() => FORMULAS[this.characteristic().formula.key]);
  protected readonly sources = computed(() => {
    const keys = Object.values(this.characteristic().formula.inputs);
    return keys.map((key) => (this.names().get(key) ?? key).toLowerCase()).join(' and ');
  });
  protected readonly unitLabel = computed(() => displayUnit(this.characteristic().unit).label);
  protected readonly digits = computed(() => {
    const { unit, decimals } = this.characteristic();
    return readingDigits(this.value() ?? 0, unit, decimals);
  });
}
