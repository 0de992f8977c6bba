import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Characteristic, type RevisionBody } from '#shared/contract/plans';
import { FORMULAS } from '#shared/measurement/formula';
import { characteristicWords, ratingWords } from '../characteristic-words';

/** Shown elsewhere in the panel, or by the table. */
const SHOWN_ELSEWHERE = new Set(['name', 'kind', 'class', 'caution', 'inputs', 'ratings']);

/** A characteristic's fields as text, each with its name. */
@Component({
  selector: 'qr-characteristic-facts',
  template: `
    <dl class="kv">
      @for (fact of facts(); track fact.name) {
        <dt>{{ fact.name }}</dt>
        <dd>{{ fact.value }}</dd>
      }
    </dl>
  `,
  styles: `
    dd {
      white-space: pre-line;
      overflow-wrap: anywhere;
    }
    dt::first-letter {
      text-transform: capitalize;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CharacteristicFacts {
  readonly characteristic = input.required<Characteristic>();
  readonly plan = input.required<RevisionBody>();

  protected readonly facts = computed(() => {
    const characteristic = this.characteristic();
    const said = [...characteristicWords(characteristic)]
      .filter(([name, value]) => value !== '' && !SHOWN_ELSEWHERE.has(name))
      .map(([name, value]) => ({ name, value }));
    return [...said, ...this.inputFacts(characteristic), { name: 'key in a rack file', value: characteristic.key }];
  });

  private inputFacts(characteristic: Characteristic) {
    if (characteristic.kind !== 'computed') return [];
    const { key, inputs, constants } = characteristic.formula;
    const nameOf = (input: string) => this.plan().characteristics.find((each) => each.key === inputs[input])?.name;
    const { inputs: taken, constants: ratings } = FORMULAS[key];
    return [
      ...taken.map(({ name, title }) => ({ name: title, value: nameOf(name) ?? 'none' })),
      ...ratings.map(({ name, title, unit }) => ({ name: title, value: ratingWords(constants[name], unit) })),
    ];
  }
}
