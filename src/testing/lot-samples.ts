import { type Assessment } from '#shared/contract/decision';
import { type Lot, type LotHead, type LotSampling } from '#shared/contract/lots';

/** The sampling of 1 200 units at level II: critical and major on 80 units, normal inspection. */
export const SAMPLING: LotSampling = {
  provisional: true,
  planId: 1,
  planNumber: 'P-001',
  revision: 2,
  level: 'II',
  severity: 'normal',
  sampleSize: 80,
  groups: [groupOf('critical', '0.15', 0, 1), groupOf('major', '1.0', 2, 3)],
};

function groupOf(
  named: 'critical' | 'major',
  aql: '0.15' | '1.0',
  acceptance: number,
  rejection: number,
): LotSampling['groups'][number] {
  return {
    key: named,
    class: named,
    level: 'II',
    aql,
    characteristicKeys: [named === 'major' ? 'ripple' : 'polarity'],
    codeLetter: 'J',
    planLetter: 'J',
    sampleSize: 80,
    acceptance,
    rejection,
    wholeLot: false,
    severity: 'normal',
  };
}

/** A lot that has arrived, as a list shows it. */
export function lotHead(changes: Partial<LotHead> = {}): LotHead {
  return {
    id: 12,
    number: 'L-26-0012',
    status: 'arrived',
    part: { id: 1, number: 'WA-12-500', name: 'Wall adapter 12 V, 500 mA' },
    supplier: { id: 2, name: 'Kestrin Power' },
    deliveryNumber: 'D-7724',
    countedQuantity: 1200,
    statedQuantity: 1200,
    arrivedAt: '2026-03-12T06:00:00.000Z',
    neededBy: null,
    targetHours: 8,
    severity: 'normal',
    sampleSize: 80,
    unitsJudged: 0,
    stopped: false,
    verdict: null,
    drawnAt: null,
    submittedAt: null,
    decidedAt: null,
    ...changes,
  };
}

/** The same lot with everything that is on record of it. */
export function lotOf(changes: Partial<Lot> = {}): Lot {
  return {
    ...lotHead(),
    orderNumber: 'PO-4383',
    dateCode: '2608',
    cartons: 12,
    place: 'Rack A3',
    note: '',
    bookedBy: 'T. Brekkan',
    sampling: SAMPLING,
    seed: null,
    drawnBy: null,
    submittedBy: null,
    decidedBy: null,
    decisionReason: null,
    holdReason: null,
    cancelReason: null,
    certificate: null,
    nonconformance: null,
    history: [],
    lastLots: [],
    version: 1,
    ...changes,
  };
}

/** What a submitted sample of two units shows; `found` major nonconforming ones. */
export function assessmentOf(
  verdict: Assessment['verdict'],
  found: number,
  changes: Partial<Assessment> = {},
): Assessment {
  return {
    lot: lotOf({
      status: 'submitted',
      drawnAt: '2026-03-12T07:00:00.000Z',
      submittedAt: '2026-03-12T09:00:00.000Z',
      version: 4,
    }),
    verdict,
    reason: `${found} major nonconforming units in 80.`,
    stoppedAtUnit: null,
    unitsJudged: 2,
    units: [
      { unit: 1, state: 'conforming', failed: [], serial: null },
      { unit: 2, state: found > 0 ? 'major' : 'conforming', failed: found > 0 ? ['ripple'] : [], serial: null },
    ],
    groups: SAMPLING.groups.map((group) => ({
      group,
      found: group.class === 'major' ? found : 0,
      undecided: 0,
      verdict: 'accepted',
      reason: '',
    })),
    characteristics: [],
    decisionRule: 'simple',
    coverageFactor: 2,
    instruments: [],
    takenBy: ['I. Sandvær'],
    repeats: 0,
    setAside: [],
    objection: null,
    measuredFrom: null,
    measuredTo: null,
    ...changes,
  };
}
