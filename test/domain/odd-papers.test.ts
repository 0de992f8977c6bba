import { certificatePdf } from '#server/documents/certificate-pdf';
import { rejectionNotice } from '#server/mail/rejection-notice';
import { LARGEST_VALUE } from '#shared/quantities/largest-value';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { attribute, certificate, measured } from './certificate-sample';

const AT = '2026-03-18T15:06:12.000Z';

const text = (most: number) =>
  fc.oneof(
    fc.string({ unit: 'binary', maxLength: most }),
    fc.constantFrom('', '\ud800', '\u0000', '\u202e', 'W'.repeat(most), '\n'.repeat(most), '🔌'.repeat(most / 2)),
  );
const value = fc.oneof(
  fc.double({ min: -LARGEST_VALUE, max: LARGEST_VALUE, noNaN: true }),
  fc.constantFrom(0, -0, 5e-324, LARGEST_VALUE, -LARGEST_VALUE),
);
const content = fc.record({
  name: text(60),
  condition: text(60),
  address: text(300),
  reason: text(120),
  value,
  limit: value,
  rows: fc.integer({ min: 1, max: 40 }),
  unit: fc.constantFrom('V', 'mV p-p', 'MΩ', '%', 'µF', '°C', 'mm'),
  decimals: fc.integer({ min: 0, max: 6 }),
});
type Content = typeof content extends fc.Arbitrary<infer T> ? T : never;

function oddCertificate({ name, condition, address, reason, value: given, limit, rows, unit, decimals }: Content) {
  const row = {
    name,
    condition,
    unit,
    decimals,
    lowerLimit: limit,
    upperLimit: given,
    min: given,
    mean: given,
    max: limit,
  };
  const judged = attribute({ name, requirement: reason, found: 3, failReasons: [reason, name] });
  return certificate({
    issuer: { name, department: name, address },
    supplier: name,
    part: { number: 'A', name: reason },
    results: [...Array.from({ length: rows }, () => measured(row)), judged],
    inspector: { name, title: 'Inspector', stampNumber: null, signedAt: AT },
  });
}

function oddNotice({ name, condition, address, reason, value: given, limit, unit, decimals }: Content) {
  const reading = { unit: 1, value: given, reason, attempt: 2 };
  return {
    siteName: name,
    department: name,
    lot: { number: 'L-26-0001', size: 3, deliveryNumber: condition, orderNumber: condition, dateCode: condition },
    part: { number: 'A', name: reason },
    supplier: name,
    plan: { number: 'P-001', revision: 1 },
    nonconformance: { number: 'NC-26-001', openedAt: AT },
    reason: address,
    groups: [],
    failures: [
      {
        ...{ characteristicKey: 'a', name, class: 'major' as const, unit, decimals, requirement: null },
        ...{ lowerLimit: limit, upperLimit: given, readings: [reading, { ...reading, value: null }] },
      },
    ],
    containment: address,
    signedBy: { name, stampNumber: null },
    link: null,
  };
}

describe('papers of whatever the forms let in', () => {
  it('are made: no text and no value stops a certificate or a notice', { timeout: 60_000 }, async () => {
    await fc.assert(
      fc.asyncProperty(content, async (one) => {
        const pdf = await certificatePdf(oddCertificate(one), 'a'.repeat(64));
        expect(pdf.subarray(0, 5).toString()).toBe('%PDF-');
        expect(rejectionNotice(oddNotice(one)).subject).toBe('Lot L-26-0001 rejected [NC-26-001]');
      }),
      { numRuns: 25, seed: 20260312, endOnFailure: true },
    );
  });
});
