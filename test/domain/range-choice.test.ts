import { chosenRange, fittingRanges, RangeRefused, type ChoosableRange } from '#shared/uncertainty/range-choice';
import { describe, expect, it } from 'vitest';

const digital = (
  id: number,
  name: string,
  fullScale: number,
  current: 'dc' | 'ac' = 'dc',
  unit: 'V' | 'K' = 'V',
): ChoosableRange => ({
  id,
  form: 'digital',
  name,
  unit,
  current,
  fullScale,
  resolution: fullScale / 20_000,
  ofReading: 0.0005,
  ofRange: 0,
  counts: 2,
});
const screen: ChoosableRange = {
  id: 9,
  form: 'graticule',
  name: 'Channel 1',
  unit: 'V',
  screenDivisions: 8,
  ofReading: 0.03,
  ofFullScale: 0,
  readingStep: 0.1,
};
const RANGES = [digital(1, '200 V', 200), digital(2, '2 V AC', 2, 'ac'), digital(3, '20 V', 20), screen];
const DIRECT = { unit: 'V', readAs: 'direct' } as const;

describe('the range of a reading', () => {
  it('is the smallest that holds the value', () => {
    expect(chosenRange(RANGES, null, 12, DIRECT)?.name).toBe('20 V');
    expect(chosenRange(RANGES, null, -150, DIRECT)?.name).toBe('200 V');
  });

  it('reads direct current before alternating current', () => {
    expect(fittingRanges(RANGES, DIRECT).map(({ name }) => name)).toEqual(['20 V', '200 V', '2 V AC']);
    expect(chosenRange(RANGES, null, 1.5, DIRECT)?.name).toBe('20 V');
  });

  it('of divisions is a screen, whatever their height', () => {
    expect(chosenRange(RANGES, null, 19, { unit: 'V p-p', readAs: 'scope' })?.name).toBe('Channel 1');
  });

  it('is the one that is named, which must read the quantity and hold the value', () => {
    expect(chosenRange(RANGES, 1, 12, DIRECT)?.name).toBe('200 V');
    expect(() => chosenRange(RANGES, 3, 48, DIRECT)).toThrow(/^48\sV is above the range 20 V\.$/);
    expect(() => chosenRange(RANGES, 9, 12, DIRECT)).toThrow(RangeRefused);
    expect(() => chosenRange(RANGES, 77, 12, DIRECT)).toThrow('no such range');
  });

  it('does not exist above every range, and is unknown where no range reads the quantity', () => {
    expect(() => chosenRange(RANGES, null, 400, DIRECT)).toThrow(/^400\sV is above every range/);
    expect(chosenRange(RANGES, null, 12, { unit: 'MΩ', readAs: 'direct' })).toBeUndefined();
  });

  it('of a temperature in °C is one in kelvins', () => {
    const thermometer = digital(4, 'Probe', 150, 'dc', 'K');
    expect(chosenRange([thermometer], null, 45, { unit: '°C', readAs: 'direct' })?.name).toBe('Probe');
  });
});
