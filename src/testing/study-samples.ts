import { type GaugeStudy } from '#shared/contract/gauge-studies';
import { gaugeStudyResults } from '#shared/statistics/gauge-study/study-results';

/** An open study of two parts by two persons, two trials each, one reading of which is missing. */
export const OPEN_STUDY: GaugeStudy = {
  id: 4,
  version: 2,
  number: 'GS-26-004',
  title: 'Loaded voltage by multimeter',
  instrument: { id: 3, assetNumber: 'DM-11', description: 'Bench multimeter' },
  quantity: 'Loaded voltage',
  unit: 'V',
  decimals: 2,
  lowerLimit: 11.4,
  upperLimit: 12.9,
  parts: ['Unit 1', 'Unit 2'],
  persons: ['I. Sandvær', 'P. Lindqvar'],
  trials: 2,
  values: [
    [
      [12.1, 12.11],
      [12.12, 12.1],
    ],
    [
      [12.4, 12.41],
      [12.42, null],
    ],
  ],
  note: '',
  status: 'open',
  entered: 7,
  needed: 8,
  gaugeOfVariation: null,
  author: 'M. Aldoush',
  createdAt: '2026-03-01T08:00:00.000Z',
  closedAt: null,
  results: null,
};

const WHOLE = OPEN_STUDY.values.map((rows) => rows.map((cell) => cell.map((value) => value ?? 12.4)));

/** The same, whole and closed. */
export const CLOSED_STUDY: GaugeStudy = {
  ...OPEN_STUDY,
  values: WHOLE,
  entered: 8,
  gaugeOfVariation: 0.05,
  status: 'closed',
  closedAt: '2026-03-02T08:00:00.000Z',
  results: gaugeStudyResults(WHOLE, 1.5),
};
