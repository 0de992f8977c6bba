import { stripGeometry } from './strip-geometry';
import { stripScale } from './strip-scale';

function strip(limits: { lower: number | null; upper: number | null }, value: number | null, uncertainty = 0) {
  return stripGeometry({
    limits,
    scale: stripScale(limits),
    value,
    uncertainty,
    guard: uncertainty,
    width: 120,
    margin: 3,
    leastGuard: 0,
  });
}

describe('the scale of a limit strip', () => {
  it('leaves a quarter of the band free on each side of two limits', () => {
    expect(stripScale({ lower: 10, upper: 14 })).toEqual({ min: 9, max: 15 });
  });

  it('runs from half of an upper limit to a sixth above it', () => {
    const { min, max } = stripScale({ lower: null, upper: 2.4 });
    expect(min).toBeCloseTo(1.2);
    expect(max).toBeCloseTo(2.8);
  });

  it('runs from a sixth below a lower limit to half above it', () => {
    const { min, max } = stripScale({ lower: 120, upper: null });
    expect(min).toBeCloseTo(100);
    expect(max).toBeCloseTo(180);
  });

  it('also grows to the right for a negative upper limit', () => {
    const { min, max } = stripScale({ lower: null, upper: -5 });
    expect(min).toBeLessThan(-5);
    expect(max).toBeGreaterThan(-5);
  });

  it('is the one the plan sets, where it sets one', () => {
    expect(stripScale({ lower: null, upper: 2 }, { min: 0, max: 4 })).toEqual({ min: 0, max: 4 });
  });
});

describe('a limit strip', () => {
  it('puts the reading where it lies between the limits', () => {
    expect(strip({ lower: 10, upper: 14 }, 12).reading).toBe(60);
  });

  it('narrows the accepted part by the guard bands', () => {
    const drawn = strip({ lower: 10, upper: 14 }, null, 0.5);
    expect(drawn.band).toEqual({ x: 20, width: 80 });
    expect(drawn.accept).toEqual({ x: 30, width: 60 });
  });

  it('leaves the open side without guard band and limit', () => {
    const drawn = strip({ lower: null, upper: 2.4 }, null, 0.1);
    expect(drawn.accept.x).toBe(0);
    expect(drawn.limits).toHaveLength(1);
  });

  it('keeps a reading off the scale at the edge and says on which side', () => {
    const high = strip({ lower: 10, upper: 14 }, 40);
    expect(high.beyond).toBe('high');
    expect(high.reading).toBe(117);
    expect(strip({ lower: 10, upper: 14 }, 2).beyond).toBe('low');
  });

  it('clips the whisker at the ends', () => {
    expect(strip({ lower: 10, upper: 14 }, 9.1, 0.5).whisker).toEqual({ x: 0, width: expect.closeTo(12) });
  });

  it('has neither tick nor whisker without a reading', () => {
    const drawn = strip({ lower: 10, upper: 14 }, null, 0.5);
    expect(drawn.reading).toBeNull();
    expect(drawn.whisker).toBeNull();
  });
});
