import { type RevisionBody } from '../contract/plans';
import { type Fault } from '../contract/problem';
import { formatQuantity } from '../quantities/format-quantity';
import { leavesNoAcceptance } from '../uncertainty/guard-band';
import { type LimitedCharacteristic } from './plan-content';

type Limits = Pick<LimitedCharacteristic, 'lowerLimit' | 'upperLimit'>;

/** Whether U takes all there is: two guard bands that meet, or an upper limit above 0 and less than U. */
function takesAll({ lowerLimit: lower, upperLimit: upper }: Limits, expandedUncertainty: number): boolean {
  if (lower === null && upper !== null && upper > 0) return expandedUncertainty > upper;
  return leavesNoAcceptance({ lower, upper }, expandedUncertainty);
}

/**
 * Characteristics whose guard bands would leave nothing to accept: with such a plan every unit would be refused, or with bands
 * on both sides be conditional at best. With one upper limit the values from 0 up to it count as what there is to accept.
 *
 * Source: ILAC-G8:09/2019, 4.2 (acceptance limits at w = U); that this is a fault of the plan is the product's own rule.
 *
 * @param typicalUncertainty U of a usual reading by characteristic key, in SI base units; one that is not known raises nothing
 */
export function guardFaults(
  { characteristics, decisionRule }: Pick<RevisionBody, 'characteristics' | 'decisionRule'>,
  typicalUncertainty: ReadonlyMap<string, number>,
): Fault[] {
  if (decisionRule === 'simple') return [];
  return characteristics.flatMap((one, index) => {
    const expandedUncertainty = typicalUncertainty.get(one.key);
    if (one.kind === 'attribute' || expandedUncertainty === undefined) return [];
    if (!takesAll(one, expandedUncertainty)) return [];
    const field = one.upperLimit === null ? 'lowerLimit' : 'upperLimit';
    const message = `Guard bands of ${formatQuantity(expandedUncertainty, one.unit)} leave nothing to accept within the limits. Widen the limits, measure finer, or choose simple acceptance.`;
    return [{ path: ['characteristics', index, field], message }];
  });
}
