import { certificatePdf } from '#server/documents/certificate-pdf';
import { attribute, certificate, measured } from '../domain/certificate-sample';
import { median, quantile } from './quantile';
import { type Line } from './report';
import { timesOf } from './timing';

/** Twelve characteristics, as many as a usual plan has. */
const results = [
  ...Array.from({ length: 10 }, (_, index) => measured({ name: `Voltage ${index + 1}`, unit: 'V' })),
  ...[attribute(), attribute({ name: 'Housing' })],
];

export async function measureCertificate(): Promise<Line[]> {
  const data = certificate({ results });
  const [first = 0, ...later] = await timesOf(31, () => certificatePdf(data, '0'.repeat(64)));
  const middle = median(later);
  return [
    {
      what: 'certificate PDF, not signed yet',
      measured: `first ${first.toFixed(0)} ms, median ${middle.toFixed(0)}, p95 ${quantile(later, 0.95).toFixed(0)}`,
      bar: '< 150 ms',
      holds: middle < 150,
    },
  ];
}
