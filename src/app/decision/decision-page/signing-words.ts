import { type Assessment } from '#shared/contract/decision';
import { formatNumber } from '#shared/quantities/format-number';

/** What the sample asks for, and what follows from each signature, in sentences. */
export interface SigningWords {
  readonly says: string;
  /** Consequences of signing. */
  readonly release: string;
  readonly reject: string;
  readonly hold: string;
}

export function signingWords({ lot, verdict, units }: Assessment): SigningWords {
  const removed = units.filter(({ state }) => state === 'minor' || state === 'major' || state === 'critical').length;
  const released = formatNumber(lot.countedQuantity - removed, 0);
  const taken =
    removed === 0
      ? ''
      : ` ${formatNumber(removed, 0)} nonconforming ${removed === 1 ? 'unit is' : 'units are'} taken out.`;
  const says = {
    accepted: 'The sample supports acceptance. The verdict stands when quality signs it.',
    rejected: 'A rejection number is reached. The verdict stands when quality signs it.',
    continue: 'The sample is not judged to the end. Send the lot back to the bench.',
  }[verdict];
  return {
    says,
    release: `${released} units go to stock and a certificate of conformance is issued.${taken}`,
    reject: `All ${formatNumber(lot.countedQuantity, 0)} units go on hold, a nonconformance is opened, and engineering is told by e-mail.`,
    hold: 'The lot goes on hold without a verdict, and no certificate is issued. Quality can end the hold later.',
  };
}
