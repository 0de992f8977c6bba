import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cartonSizes } from '#shared/sampling/carton-sizes';
import { cartonOf, drawPositions } from '#shared/sampling/draw-positions';

const seeds = fc.integer({ min: 0, max: 0xffff_ffff });

/** Any lot with a sample and cartons that fit it. */
const draws = fc.integer({ min: 1, max: 5000 }).chain((lotSize) =>
  fc.record({
    lotSize: fc.constant(lotSize),
    sampleSize: fc.integer({ min: 1, max: Math.min(lotSize, 500) }),
    cartons: fc.integer({ min: 1, max: Math.min(lotSize, 60) }),
    seed: seeds,
  }),
);

/** Position and carton in draw order, recomputed apart from this program from the written description of the draw. */
const RECORDED = '17/2 25/2 1/1 30/3 43/4 3/1 37/3 40/4';

describe('drawing a sample', () => {
  it('draws the wanted number of distinct positions inside the lot', () => {
    fc.assert(
      fc.property(draws, (draw) => {
        const positions = drawPositions(draw).map(({ position }) => position);
        expect(new Set(positions).size).toBe(draw.sampleSize);
        expect(Math.min(...positions)).toBeGreaterThanOrEqual(1);
        expect(Math.max(...positions)).toBeLessThanOrEqual(draw.lotSize);
      }),
    );
  });

  it('numbers the units in draw order from 1', () => {
    const units = drawPositions({ lotSize: 1200, sampleSize: 80, cartons: 24, seed: 7 }).map(({ unit }) => unit);
    expect(units).toEqual(Array.from({ length: 80 }, (_, index) => index + 1));
  });

  it('takes from each carton its share, to within one unit', () => {
    fc.assert(
      fc.property(draws, (draw) => {
        const drawn = drawPositions(draw);
        cartonSizes(draw.lotSize, draw.cartons).forEach((size, index) => {
          const taken = drawn.filter(({ carton }) => carton === index + 1).length;
          const share = (draw.sampleSize * size) / draw.lotSize;
          expect(taken).toBeGreaterThanOrEqual(Math.floor(share));
          expect(taken).toBeLessThanOrEqual(Math.ceil(share));
        });
      }),
    );
  });

  it('names the carton that holds each position', () => {
    fc.assert(
      fc.property(draws, (draw) => {
        for (const { position, carton } of drawPositions(draw)) {
          expect(cartonOf(position, draw.lotSize, draw.cartons)).toBe(carton);
        }
      }),
    );
  });

  it('draws the same sample again from the same seed', () => {
    fc.assert(
      fc.property(draws, (draw) => {
        expect(drawPositions({ ...draw })).toEqual(drawPositions(draw));
      }),
    );
  });

  it('draws other samples from neighbouring seeds', () => {
    const first = Array.from({ length: 200 }, (_, seed) =>
      drawPositions({ lotSize: 1000, sampleSize: 5, cartons: 1, seed }),
    );
    expect(new Set(first.map((drawn) => drawn[0]?.position)).size).toBeGreaterThan(150);
  });

  it('draws the recorded sample of a known seed, so that an old lot can be drawn again', () => {
    const drawn = drawPositions({ lotSize: 50, sampleSize: 8, cartons: 4, seed: 20260312 });
    expect(drawn.map(({ position, carton }) => `${position}/${carton}`).join(' ')).toBe(RECORDED);
  });

  it('opens every carton in turn where there are more cartons than units to draw', () => {
    const opened = new Map<number, number>();
    for (let seed = 0; seed < 3000; seed += 1) {
      for (const { carton } of drawPositions({ lotSize: 100, sampleSize: 8, cartons: 30, seed })) {
        opened.set(carton, (opened.get(carton) ?? 0) + 1);
      }
    }
    // 8 of 100 units: a carton of 4 is opened 960 times in 3000 draws, one of 3 720 times; 5 standard deviations allowed.
    cartonSizes(100, 30).forEach((size, index) => {
      const expected = (3000 * 8 * size) / 100;
      expect(Math.abs((opened.get(index + 1) ?? 0) - expected)).toBeLessThan(5 * Math.sqrt(expected));
    });
  });

  it('puts each unit at each place of the draw order equally often', () => {
    const firsts = new Array<number>(10).fill(0);
    for (let seed = 0; seed < 5000; seed += 1) {
      const position = drawPositions({ lotSize: 10, sampleSize: 3, cartons: 2, seed })[0]?.position ?? 0;
      firsts[position - 1] = (firsts[position - 1] ?? 0) + 1;
    }
    for (const times of firsts) expect(Math.abs(times - 500)).toBeLessThan(5 * Math.sqrt(450));
  });

  it('draws the whole lot where the sample is the whole lot', () => {
    const positions = drawPositions({ lotSize: 13, sampleSize: 13, cartons: 3, seed: 1 }).map(
      ({ position }) => position,
    );
    expect([...positions].sort((a, b) => a - b)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13]);
  });
});

describe('packing a lot evenly', () => {
  it('gives the units left over to the first cartons', () => {
    expect(cartonSizes(11, 3)).toEqual([4, 4, 3]);
  });

  it('finds the carton on both sides of a boundary', () => {
    expect([4, 5, 8, 9, 11].map((position) => cartonOf(position, 11, 3))).toEqual([1, 2, 2, 3, 3]);
  });
});

describe('a draw that cannot be made', () => {
  const good = { lotSize: 50, sampleSize: 8, cartons: 4, seed: 1 };

  it.each([
    ['lotSize', { lotSize: 0 }],
    ['sampleSize', { sampleSize: 51 }],
    ['sampleSize', { sampleSize: 0 }],
    ['cartons', { cartons: 51 }],
    ['cartons', { cartons: 1.5 }],
    ['seed', { seed: -1 }],
    ['seed', { seed: 0.5 }],
    ['seed', { seed: 2 ** 32 }],
  ])('names %s', (argument, change) => {
    expect(() => drawPositions({ ...good, ...change })).toThrow(RangeError);
    expect(() => drawPositions({ ...good, ...change })).toThrow(new RegExp(argument));
  });

  it('names a position outside the lot', () => {
    expect(() => cartonOf(51, 50, 4)).toThrow(/position/);
  });
});
