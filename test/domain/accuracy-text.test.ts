import { accuracyText, resolutionText } from '#shared/uncertainty/accuracy-text';
import { describe, expect, it } from 'vitest';

const plain = (text: string) => text.replaceAll(/\s/g, ' ');
const DISPLAY = {
  ...({ id: 1, form: 'digital', name: '20 V', unit: 'V' } as const),
  ...{ fullScale: 20, resolution: 0.001, ofReading: 0, ofRange: 0, counts: 0 },
};
const SCREEN = {
  ...({ id: 2, form: 'graticule', name: 'Screen', unit: 'V' } as const),
  ...{ screenDivisions: 8, ofReading: 0.03, ofFullScale: 0, readingStep: 0.1 },
};

describe('the accuracy of a range', () => {
  it('is written as its maker writes it, without the terms it has not', () => {
    const three = { ...DISPLAY, ofReading: 0.00025, ofRange: 0.0001, counts: 1 };
    expect(plain(accuracyText(three))).toBe('±(0.025 % of reading + 0.01 % of range + 1 count of 1 mV)');
    expect(plain(accuracyText({ ...DISPLAY, counts: 12 }))).toBe('±(12 counts of 1 mV)');
    expect(plain(accuracyText(SCREEN))).toBe('±(3 % of reading)');
    expect(plain(accuracyText({ ...SCREEN, ofFullScale: 0.015 }))).toBe(
      '±(3 % of reading + 1.5 % of the screen’s height)',
    );
    expect(accuracyText(DISPLAY)).toBe('none stated');
  });

  it('stands beside how finely it is read', () => {
    expect(plain(resolutionText(DISPLAY))).toBe('resolution 1 mV');
    expect(resolutionText(SCREEN)).toBe('read to 0.1 division');
  });
});
