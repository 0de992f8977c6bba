import { type CertificateData, type CertificateResult } from '#shared/papers/certificate-data';

/** A measured characteristic of a certificate: ripple with its upper limit, unless told otherwise. */
export function measured(more: Partial<CertificateResult> = {}): CertificateResult {
  return {
    name: 'Ripple',
    condition: 'at 500 mA',
    class: 'major',
    kind: 'measured',
    unit: 'V p-p',
    decimals: 2,
    lowerLimit: null,
    upperLimit: 2.4,
    requirement: null,
    n: 80,
    found: 1,
    min: 1.58,
    mean: 1.931,
    max: 2.44,
    failReasons: [],
    acceptance: 2,
    rejection: 3,
    ...more,
  };
}

/** A characteristic judged by eye. */
export function attribute(more: Partial<CertificateResult> = {}): CertificateResult {
  const judged = { name: 'Marking', condition: '', class: 'minor', kind: 'attribute', unit: null } as const;
  const noValues = { decimals: 0, upperLimit: null, min: null, mean: null, max: null };
  return measured({ ...judged, ...noValues, requirement: 'Legible, complete', found: 0, ...more });
}

export function certificate(more: Partial<CertificateData> = {}): CertificateData {
  const group = { level: 'II', codeLetter: 'J', sampleSize: 80 };
  return {
    number: 'CC-26-0187',
    issuer: { name: 'Hollowmere Controls', department: 'Incoming inspection', address: '14 Sluice Lane, Hollowmere' },
    lot: {
      number: 'L-26-0421',
      size: 1200,
      deliveryNumber: 'D-7702',
      orderNumber: 'HC-50213',
      dateCode: '2608',
      arrivedAt: '2026-03-16T08:10:00.000Z',
    },
    part: { number: 'WA-12-500', name: 'wall adapter 12 V, 500 mA' },
    supplier: 'Omdal Vik Supply',
    plan: { number: 'P-014', revision: 4, level: 'II', severity: 'normal' },
    scheme: 'ANSI/ASQ Z1.4 (tables of MIL-STD-105E)',
    sampleSize: 80,
    unitsJudged: 80,
    groups: [
      { ...group, class: 'major', aql: '1.0', acceptance: 2, rejection: 3, found: 1 },
      { ...group, class: 'minor', aql: '2.5', acceptance: 5, rejection: 6, found: 2 },
    ],
    results: [measured(), attribute({ found: 2, failReasons: ['Smeared', 'Smeared'] })],
    decisionRule: 'simple',
    repeats: 2,
    unitsRemoved: 3,
    unitsReleased: 1197,
    instruments: [{ assetNumber: 'OS-03', kind: 'Oscilloscope', calibrationDue: '2026-09-30' }],
    measuredFrom: '2026-03-17T09:00:00.000Z',
    measuredTo: '2026-03-18T14:59:00.000Z',
    inspector: { name: 'I. Sandvær', title: 'Inspector', stampNumber: '07', signedAt: '2026-03-18T15:06:12.000Z' },
    quality: { name: 'M. Aldoush', title: 'Quality engineer', stampNumber: '11', signedAt: '2026-03-18T15:41:00.000Z' },
    issuedAt: '2026-03-18T15:41:00.000Z',
    ...more,
  };
}
