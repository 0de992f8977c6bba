import { failingReadingText } from '#server/documents/paper-reading';
import { lines, oneLine } from '#server/mail/one-line';
import { rejectionNotice, type RejectionNotice } from '#server/mail/rejection-notice';
import { type Failure } from '#shared/contract/nonconformances';
import { describe, expect, it } from 'vitest';

const ripple: Failure = {
  characteristicKey: 'ripple',
  name: 'Ripple at 500 mA',
  class: 'major',
  unit: 'V p-p',
  decimals: 2,
  lowerLimit: null,
  upperLimit: 2.4,
  requirement: null,
  readings: [
    { unit: 12, value: 2.61, reason: null, attempt: 1 },
    { unit: 58, value: 2.83, reason: null, attempt: 2 },
  ],
};
const marking: Failure = {
  ...ripple,
  characteristicKey: 'marking',
  name: 'Marking',
  class: 'minor',
  unit: null,
  decimals: 0,
  upperLimit: null,
  requirement: 'Legible, complete',
  readings: [{ unit: 7, value: null, reason: 'Smeared', attempt: 1 }],
};

function notice(more: Partial<RejectionNotice> = {}): RejectionNotice {
  return {
    siteName: 'Hollowmere Controls',
    department: 'Incoming inspection',
    lot: { number: 'L-26-0412', size: 1200, deliveryNumber: 'D-7688', orderNumber: 'HC-50213', dateCode: '2608' },
    part: { number: 'WA-12-500', name: 'wall adapter 12 V, 500 mA' },
    supplier: 'Kestrin Power',
    plan: { number: 'P-014', revision: 4 },
    nonconformance: { number: 'NC-26-031', openedAt: '2026-03-12T14:20:31.000Z' },
    reason: 'Rejected: 3 major nonconforming units in 80, rejection number 3 (AQL 1.0, normal, code J).',
    groups: [
      { class: 'critical', found: 0, acceptance: 0, rejection: 1, sampleSize: 80, aql: '0.065' },
      { class: 'major', found: 3, acceptance: 2, rejection: 3, sampleSize: 80, aql: '1.0' },
    ],
    failures: [ripple, marking],
    containment: 'Quarantined at the dock, bay 3.',
    signedBy: { name: 'M. Aldoush', stampNumber: '11' },
    link: 'https://quietrail.hollowmere.example/nonconformances/31',
    ...more,
  };
}

/** The words a reader sees of an HTML letter, spaces of every kind made one. */
function seen(html: string): string {
  const body = html.slice(html.indexOf('<body'));
  return plain(body.replaceAll(/<!--.*?-->|<[^>]*>/gs, ' ').replaceAll('&nbsp;', ' '));
}
const plain = (text: string) => text.replaceAll(/\s+/gu, ' ');

describe('the notice of a rejected lot', () => {
  it('names lot and nonconformance in the subject', () => {
    expect(rejectionNotice(notice()).subject).toBe('Lot L-26-0412 rejected [NC-26-031]');
  });

  it.each(['html', 'text'] as const)('says in %s what was rejected, why, and what is asked, in one order', (form) => {
    const letter = rejectionNotice(notice());
    const words = form === 'html' ? seen(letter.html) : plain(letter.text);
    const order = [
      'Hollowmere Controls',
      'Lot L-26-0412 rejected [NC-26-031]',
      'REJECTED',
      'Rejected: 3 major nonconforming units in 80',
      'The lot of 1 200 units is on hold',
      'WA-12-500, wall adapter 12 V, 500 mA',
      'Kestrin Power',
      'D-7688, order HC-50213, date code 2608',
      'P-014 rev 4',
      'NC-26-031, opened 2026-03-12 14:20 UTC',
      'Ripple at 500 mA',
      'max 2.40 V p-p',
      '2.83 V p-p',
      'unit 12: 2.61 V p-p',
      'unit 58: 2.83 V p-p (repeat 1)',
      'Legible, complete',
      'unit 7: Smeared',
      'Quarantined at the dock',
      'What we ask of you',
      'Open NC-26-031',
      'M. Aldoush, stamp 11',
    ];
    let place = 0;
    for (const phrase of order) {
      const found = words.indexOf(phrase, place);
      expect(found, `“${phrase}” after “${words.slice(Math.max(0, place - 30), place)}”`).toBeGreaterThanOrEqual(0);
      place = found;
    }
  });

  it('shows the numbers beside the subject, where a mail program previews them', () => {
    expect(seen(rejectionNotice(notice()).html)).toContain(
      '3 major nonconforming in 80, rejection number 3. 1 200 units on hold.',
    );
  });

  it('lists forty readings by unit and counts the rest', () => {
    const readings = Array.from({ length: 53 }, (_, nth) => ({ unit: nth + 1, value: 2.5, reason: null, attempt: 1 }));
    const { html, text } = rejectionNotice(notice({ failures: [{ ...ripple, readings }] }));
    for (const words of [seen(html), plain(text)]) {
      expect(words).toContain('unit 40: ');
      expect(words).not.toContain('unit 41: ');
      expect(words).toContain('and 13 more');
    }
  });

  it('has one button, and none without a public address', () => {
    expect(rejectionNotice(notice()).html.match(/<a /g)).toHaveLength(1);
    const { html, text } = rejectionNotice(notice({ link: null }));
    expect(html).not.toContain('<a ');
    expect(text).not.toContain('Open NC-26-031');
  });

  it('leaves out containment and an order that were not given', () => {
    const bare = notice({ containment: ' \n', lot: { ...notice().lot, orderNumber: '', dateCode: '' } });
    const words = seen(rejectionNotice(bare).html);
    expect(words).not.toContain('Containment');
    expect(words).not.toContain('order ,');
    expect(words).toContain('D-7688 Lot size');
  });

  it('fetches nothing from elsewhere', () => {
    const { html } = rejectionNotice(notice());
    expect(html).not.toMatch(/<(img|link|script|iframe)|url\(|@import/i);
    expect(html.match(/https?:[^"]*/g)).toEqual(['https://quietrail.hollowmere.example/nonconformances/31']);
  });
});

describe('hostile names in the notice', () => {
  const hostile = '<script>alert("1")</script> & <b onload=x>';
  const everywhere = notice({
    siteName: hostile,
    department: hostile,
    supplier: hostile,
    part: { number: hostile, name: hostile },
    reason: hostile,
    containment: hostile,
    signedBy: { name: hostile, stampNumber: hostile },
    failures: [
      { ...ripple, name: hostile },
      { ...marking, requirement: hostile, readings: [{ unit: 7, value: null, reason: hostile, attempt: 1 }] },
    ],
  });

  it('are shown as text, never as markup', () => {
    const { html, text } = rejectionNotice(everywhere);
    expect(html).not.toMatch(/<script|<b onload/);
    expect(html.split('&lt;script&gt;').length).toBeGreaterThan(10);
    expect(text).toContain(hostile);
  });

  it('cannot begin a line of their own in the plain text', () => {
    const supplier = 'Kestrin Power\r\nREJECTED is wrong\u2028accepted\u202e';
    const { text, subject } = rejectionNotice(
      notice({ supplier, nonconformance: { number: 'NC-1]\nBcc: x', openedAt: '2026-03-12T14:20:31.000Z' } }),
    );
    expect(text).toContain('Supplier: Kestrin Power REJECTED is wrong accepted\n');
    expect(subject).toBe('Lot L-26-0412 rejected [NC-1] Bcc: x]');
  });

  it('of two hundred characters stay whole', () => {
    const name = 'N'.repeat(200);
    expect(rejectionNotice(notice({ supplier: name })).html).toContain(name);
  });
});

describe('text for letters', () => {
  it('is brought to one line', () => {
    expect(oneLine('  a\r\n\tb\u0000c ')).toBe('a b c');
  });
  it('of several lines loses only what cannot be seen', () => {
    expect(lines('a\r\n\r\n b\tc\u2028d')).toEqual(['a', 'b c', 'd']);
  });
});

describe('a failing reading', () => {
  const asRead = (value: number) => plain(failingReadingText(value, ripple));
  it('is shown with the decimals of its characteristic', () => {
    expect(asRead(2.6149)).toBe('2.61 V p-p');
  });
  it('is shown finer where rounding would make it the limit', () => {
    expect(asRead(2.4004)).toBe('2.4004 V p-p');
  });
});
