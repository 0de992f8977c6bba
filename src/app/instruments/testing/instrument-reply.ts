import { type Calibration } from '#shared/contract/calibrations';
import { type Instrument } from '#shared/contract/instruments';

/** A multimeter in service with one range and a reference. */
export function instrumentReply(given: Partial<Instrument> = {}): Instrument {
  return {
    id: 3,
    version: 4,
    assetNumber: 'DM-11',
    kind: 'multimeter',
    description: 'Bench multimeter, 5½ digits',
    serialNumber: '770-0311',
    place: 'Bench 1',
    status: 'in-service',
    calibrationDue: '2035-06-20',
    daysLeft: 3000,
    dailyReference: { name: 'Reference source, 10 V', unit: 'V', value: 10, tolerance: 0.005 },
    dailyCheck: 'not-asked',
    openReview: null,
    usable: true,
    ranges: [
      {
        id: 8,
        form: 'digital',
        name: 'DC 20 V',
        unit: 'V',
        current: 'dc',
        fullScale: 20,
        resolution: 1e-4,
        ofReading: 0.0005,
        ofRange: 0,
        counts: 3,
      },
    ],
    ...given,
  };
}

/** A calibration with a point within and a point beyond what is allowed. */
export function calibrationReply(given: Partial<Calibration> = {}): Calibration {
  return {
    id: 21,
    calibratedOn: '2026-03-10',
    dueOn: '2027-03-10',
    laboratory: 'Weir Lane Calibration',
    certificateNumber: 'WL-1180',
    asFound: 'out-of-tolerance',
    adjusted: true,
    points: [
      { point: 'DC 10 V', unit: 'V', reference: 10, found: 10.001, limit: 0.0019 },
      { point: 'DC 19 V', unit: 'V', reference: 19, found: 18.996, limit: 0.0036 },
    ],
    note: '',
    file: null,
    recordedAt: '2026-03-12T08:00:00.000Z',
    recordedBy: 'R. Okonvei',
    reviewId: 5,
    ...given,
  };
}
