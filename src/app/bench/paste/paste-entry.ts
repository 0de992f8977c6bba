import { type Characteristic } from '#shared/contract/plans';
import { type TypedEntry } from '../sheet/bench-reading';

/** Words that judge an attribute, with the reason of a failure behind it: "Pass", "F", "Fail: smeared". */
const JUDGEMENT = /^(?:(p|pass|ok)|(?:f|fail)(?:[\s:,;-]+(.*))?)$/i;

/**
 * A cell of a spreadsheet as an entry of its characteristic.
 *
 * @throws {RangeError} with a sentence where the cell is no judgement of an attribute
 */
export function pastedEntry(text: string, characteristic: Characteristic, decimalComma: boolean): TypedEntry {
  if (characteristic.kind !== 'attribute') return { kind: 'direct', text, decimalComma };
  const [judged, passes, said = ''] = JUDGEMENT.exec(text) ?? [];
  if (judged === undefined) throw new RangeError(`“${text}” is neither Pass nor Fail.`);
  if (passes !== undefined) return { kind: 'attribute', pass: true, reason: '' };
  const named = characteristic.failReasons.find((each) => each.toLowerCase() === said.toLowerCase());
  const reason = named ?? said;
  if (reason === '' && characteristic.failReasons.length > 0)
    throw new RangeError(`Write the reason behind it, as “Fail: ${characteristic.failReasons[0]}”.`);
  return { kind: 'attribute', pass: false, reason };
}
