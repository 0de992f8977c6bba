import { sentenceCase } from '../ui/values/sentence-case';

/** What a page calls the things that audit entries are about. */
export const SUBJECT_TITLES: Readonly<Record<string, string>> = {
  lot: 'Lot',
  unit: 'Unit',
  reading: 'Reading',
  waveform: 'Waveform',
  nonconformance: 'Nonconformance',
  certificate: 'Certificate',
  'plan-revision': 'Plan revision',
  part: 'Part',
  supplier: 'Supplier',
  instrument: 'Instrument',
  review: 'Review',
  'gauge-study': 'Gauge study',
  person: 'Person',
  rack: 'Rack',
  'reading-batch': 'Reading batch',
  site: 'Site',
};

/** The title of a subject; one that has none is shown as it is recorded. */
export function subjectTitle(subject: string): string {
  return SUBJECT_TITLES[subject] ?? sentenceCase(subject);
}

/** A made-up id is known by its first part; a number is short as it is. */
export function shortId(id: string): string {
  return /^[0-9a-f]{8}-[0-9a-f-]{27}$/.test(id) ? id.slice(0, 8) : id;
}
