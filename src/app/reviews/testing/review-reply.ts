import { type Review } from '#shared/contract/calibrations';
import { calibrationReply } from '../../instruments/testing/instrument-reply';

type Affected = Review['affected'][number];

export function affectedLot(id: number, given: Partial<Affected> = {}): Affected {
  return {
    lot: { id, number: `L-26-000${id}`, status: 'released', part: 'WA-12-500', supplier: 'Kestrin Power' },
    readings: 12,
    firstAt: '2026-02-03T08:00:00.000Z',
    lastAt: '2026-02-03T09:00:00.000Z',
    nearLimit: 2,
    certificates: [{ id: 30 + id, number: `CC-26-000${id}`, status: 'valid' }],
    effect: null,
    note: '',
    assessedBy: null,
    ...given,
  };
}

/** An open review with two lots, one of them assessed. */
export function reviewReply(given: Partial<Review> = {}): Review {
  const affected = [
    affectedLot(1),
    affectedLot(2, { nearLimit: 0, effect: 'none', note: 'Far from every limit.', assessedBy: 'M. Aldoush' }),
  ];
  return {
    id: 5,
    version: 3,
    number: 'IR-26-001',
    instrument: { id: 3, assetNumber: 'DM-11', description: 'Bench multimeter' },
    calibration: calibrationReply(),
    calibratedOn: '2026-03-10',
    doubtFrom: '2025-09-30',
    doubtTo: '2026-03-10',
    openedAt: '2026-03-12T08:00:00.000Z',
    closedAt: null,
    closedBy: null,
    conclusion: null,
    lots: 2,
    assessed: 1,
    affected,
    ...given,
  };
}
