import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type ElectricalModel, TOPOLOGY_TITLES } from '#shared/contract/parts';
import { formatQuantity } from '#shared/quantities/format-quantity';

interface Fact {
  readonly name: string;
  readonly value: string;
  readonly figure?: boolean;
}

/** What a part is electrically, as text; what is not known is left out. */
@Component({
  selector: 'qr-electrical-facts',
  template: `
    <dl class="kv">
      @for (fact of facts(); track fact.name) {
        <dt>{{ fact.name }}</dt>
        <dd [class.mono]="fact.figure !== false">{{ fact.value }}</dd>
      }
    </dl>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ElectricalFacts {
  readonly model = input.required<ElectricalModel>();

  protected readonly facts = computed<Fact[]>(() => {
    const model = this.model();
    const known = (name: string, value: number | null, unit: string): Fact[] =>
      value === null ? [] : [{ name, value: formatQuantity(value, unit) }];
    return [
      { name: 'Circuit', value: TOPOLOGY_TITLES[model.topology], figure: false },
      ...capacitorFact(model),
      {
        name: 'Rated output',
        value: `${formatQuantity(model.ratedVolts, 'V')}, ${formatQuantity(model.ratedAmperes, 'A')}`,
      },
      { name: 'Mains', value: `${formatQuantity(model.lineVolts, 'V')}, ${model.lineHertz}\u00a0Hz` },
      ...known('Secondary peak', model.secondaryPeakVolts, 'V'),
      ...known('Source resistance', model.sourceOhms, 'Ω'),
      ...known('Diode drop', model.diodeDropVolts, 'V'),
      ...known('Capacitor ESR', model.filterEsrOhms, 'Ω'),
      ...rippleFact(model),
    ];
  });
}

function capacitorFact({ filterFarads, filterTolerance }: ElectricalModel): Fact[] {
  if (filterFarads === null) return [];
  const tolerance = filterTolerance === null ? '' : ` ± ${formatQuantity(filterTolerance, '%')}`;
  return [{ name: 'Capacitor', value: formatQuantity(filterFarads, 'F') + tolerance }];
}

/** Once a line period with one rectified half, twice with both. */
function rippleFact({ topology, lineHertz }: ElectricalModel): Fact[] {
  if (topology === 'half-wave') return [{ name: 'Ripple frequency', value: `${lineHertz}\u00a0Hz` }];
  if (topology === 'centre-tap' || topology === 'bridge')
    return [{ name: 'Ripple frequency', value: `${2 * lineHertz}\u00a0Hz` }];
  return [];
}
