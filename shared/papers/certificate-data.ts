import { type LotConditions } from '../contract/conditions';
import { type DecisionRule } from '../uncertainty/guard-band';
import { type NonconformityClass } from '../sampling/scheme';

/** A person's signature under a paper: name, stamp and instant (UTC, ISO 8601). */
export interface Signature {
  name: string;
  title: string;
  stampNumber: string | null;
  signedAt: string;
}

/** One line of a certificate's results; values in SI base units. */
export interface CertificateResult {
  name: string;
  condition: string;
  class: NonconformityClass;
  kind: 'measured' | 'computed' | 'attribute';
  unit: string | null;
  decimals: number;
  lowerLimit: number | null;
  upperLimit: number | null;
  requirement: string | null;
  n: number;
  found: number;
  min: number | null;
  mean: number | null;
  max: number | null;
  /** The largest U of its readings; null where that of one is not known. Papers stated before readings had one lack it. */
  expandedUncertainty?: number | null;
  failReasons: string[];
  acceptance: number;
  rejection: number;
}

/** All that a certificate of conformance states; its digest is printed in the paper. */
export interface CertificateData {
  number: string;
  issuer: { name: string; department: string; address: string };
  lot: {
    number: string;
    size: number;
    deliveryNumber: string;
    orderNumber: string;
    dateCode: string;
    arrivedAt: string;
  };
  part: { number: string; name: string };
  supplier: string;
  plan: { number: string; revision: number; level: string; severity: string };
  scheme: string;
  sampleSize: number;
  unitsJudged: number;
  groups: {
    class: NonconformityClass;
    level: string;
    aql: string;
    codeLetter: string;
    sampleSize: number;
    acceptance: number;
    rejection: number;
    found: number;
  }[];
  results: CertificateResult[];
  decisionRule: DecisionRule;
  /** k of every U. Papers stated before readings had an uncertainty lack it, as they lack what follows. */
  coverageFactor?: number;
  /** What the lot was measured under, as noted last, and the warm-up that the plan asks for. */
  conditions?: (LotConditions & { warmUpMinutes: number | null }) | null;
  /** Units that the rule left undecided and quality ruled conforming. */
  unitsRuled?: number;
  repeats: number;
  unitsRemoved: number;
  unitsReleased: number;
  instruments: { assetNumber: string; kind: string; calibrationDue: string }[];
  measuredFrom: string;
  measuredTo: string;
  inspector: Signature;
  quality: Signature;
  issuedAt: string;
}
