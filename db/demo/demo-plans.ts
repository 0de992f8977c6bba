import { type RevisionBody } from '#shared/contract/plans';
import { type DemoPart } from './demo-part';
import { CABLE_LENGTH, planCharacteristics } from './plan-characteristics';

/** The part whose plan is revised during the quarter and has a draft at its end. */
export const REVISED_PART = 'WA-12-500';
/** The part whose next revision waits for approval at the end. */
export const REVIEWED_PART = 'OF-24-2A5';

const CLASS_AQLS: RevisionBody['classAqls'] = [
  { class: 'critical', aql: '0.15' },
  { class: 'major', aql: '1.0' },
  { class: 'minor', aql: '2.5' },
];

export function firstRevision(part: DemoPart): RevisionBody {
  return {
    level: 'II',
    classAqls: CLASS_AQLS,
    characteristics: planCharacteristics(part),
    decisionRule: 'simple',
    coverageFactor: 2,
    warmUpMinutes: null,
    changeNote: 'First issue.',
  };
}

/** Cables of two lengths had been mixed. */
export function secondRevision(part: DemoPart): RevisionBody {
  const first = firstRevision(part);
  return {
    ...first,
    characteristics: [...first.characteristics, CABLE_LENGTH],
    changeNote: 'Cable length added: two lengths had been mixed in one delivery.',
  };
}

/** A tighter limit for the ripple, after rejected lots. */
export function thirdRevision(part: DemoPart): RevisionBody {
  const second = secondRevision(part);
  return {
    ...second,
    characteristics: second.characteristics.map((one) =>
      one.kind === 'measured' && one.key === 'ripple_pp' ? { ...one, upperLimit: 2.3 } : one,
    ),
    changeNote: 'Ripple limit 2.40 V to 2.30 V p-p, after lots with low capacitance.',
  };
}

/** More units for the balance, after a lot with a badly tapped transformer. */
export function reviewedRevision(part: DemoPart): RevisionBody {
  const first = firstRevision(part);
  return {
    ...first,
    characteristics: first.characteristics.map((one) =>
      ['half1_peak', 'half2_peak', 'balance'].includes(one.key) ? { ...one, ownLevel: 'S-3' } : one,
    ),
    changeNote: 'Balance at level S-3 instead of S-2, after a lot with a badly tapped transformer.',
  };
}
