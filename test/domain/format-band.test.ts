import { formatBand } from '#shared/quantities/format-band';
import { expect, it } from 'vitest';

const plain = (text: string) => text.replace(/\s/g, ' ');

it('says the unit of a band once where both ends have the same', () => {
  expect(plain(formatBand(1.5, 2.3, 'V', { significant: 2 }))).toBe('1.5 to 2.3 V');
  expect(plain(formatBand(1.5, 2.3, 'V p-p', { significant: 3 }))).toBe('1.50 to 2.30 V p-p');
  expect(plain(formatBand(0.85, 1.2, 'V', { significant: 2 }))).toBe('850 mV to 1.2 V');
  expect(plain(formatBand(0.1, 0.2, ''))).toBe('0.1 to 0.2');
});
