import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { GridWalk, type GridMove, type GridPlace } from '#shared/bench/grid-walk';

const typed = (requiredTo: number) => ({ typed: true, requiredTo });
const computed = (requiredTo: number) => ({ typed: false, requiredTo });

/** Eight units: two voltages, a computed regulation, and a slow insulation test on the first three units only. */
const walk = new GridWalk(8, [typed(8), typed(8), computed(8), typed(3)]);
const at = (unit: number, column: number): GridPlace => ({ unit, column });

describe('moving the focus of the measuring grid', () => {
  it('stops at the edges', () => {
    expect(walk.move(at(1, 0), 'up')).toEqual(at(1, 0));
    expect(walk.move(at(8, 3), 'down')).toEqual(at(8, 3));
    expect(walk.move(at(1, 0), 'left')).toEqual(at(1, 0));
    expect(walk.move(at(1, 3), 'right')).toEqual(at(1, 3));
  });

  it('goes to the ends of the row and of the grid, and ten units at a time', () => {
    expect(walk.move(at(4, 1), 'row-end')).toEqual(at(4, 3));
    expect(walk.move(at(4, 1), 'row-start')).toEqual(at(4, 0));
    expect(walk.move(at(4, 1), 'last')).toEqual(at(8, 3));
    expect(walk.move(at(4, 1), 'first')).toEqual(at(1, 0));
    expect(new GridWalk(80, [typed(80)]).move(at(45, 0), 'page-down')).toEqual(at(55, 0));
    expect(walk.move(at(4, 1), 'page-up')).toEqual(at(1, 1));
  });

  it('never leaves the grid, whatever the moves', () => {
    const moves: GridMove[] = [
      'up',
      'down',
      'left',
      'right',
      'row-start',
      'row-end',
      'first',
      'last',
      'page-up',
      'page-down',
    ];
    fc.assert(
      fc.property(fc.array(fc.constantFrom(...moves), { maxLength: 40 }), (steps) => {
        const end = steps.reduce((place, step) => walk.move(place, step), at(1, 0));
        expect(end.unit).toBeGreaterThanOrEqual(1);
        expect(end.unit).toBeLessThanOrEqual(8);
        expect(end.column).toBeGreaterThanOrEqual(0);
        expect(end.column).toBeLessThanOrEqual(3);
      }),
    );
  });

  it('refuses a grid without units or columns', () => {
    expect(() => new GridWalk(0, [typed(1)])).toThrow(RangeError);
    expect(() => new GridWalk(5, [])).toThrow(RangeError);
  });
});

describe('the next characteristic', () => {
  it('passes over what is computed, and goes to the next unit at the row end', () => {
    expect(walk.next(at(2, 1))).toEqual(at(2, 3));
    expect(walk.next(at(2, 3))).toEqual(at(3, 0));
  });

  it('passes over a characteristic that is not asked of the unit', () => {
    expect(walk.next(at(4, 1))).toEqual(at(5, 0));
    expect(walk.previous(at(5, 0))).toEqual(at(4, 1));
  });

  it('leaves the grid behind the last place and before the first', () => {
    expect(walk.next(at(8, 1))).toBeNull();
    expect(walk.previous(at(1, 0))).toBeNull();
  });

  it('goes back over the same places', () => {
    const forth: GridPlace[] = [];
    for (let place: GridPlace | null = at(1, 0); place !== null; place = walk.next(place)) forth.push(place);
    const back: GridPlace[] = [];
    for (let place: GridPlace | null = at(8, 1); place !== null; place = walk.previous(place)) back.push(place);
    expect(back.reverse()).toEqual(forth);
    expect(forth).toHaveLength(8 + 8 + 3);
  });
});

describe('where the focus goes once a reading is kept', () => {
  const nothingOpen = () => false;

  it('goes down one unit when one characteristic is measured on all units', () => {
    expect(walk.afterKeeping(at(3, 1), 'by-characteristic', nothingOpen)).toEqual(at(4, 1));
  });

  it('goes along the row when one unit is measured completely', () => {
    expect(walk.afterKeeping(at(3, 1), 'by-unit', nothingOpen)).toEqual(at(3, 3));
    expect(walk.afterKeeping(at(4, 1), 'by-unit', nothingOpen)).toEqual(at(5, 0));
  });

  it('goes to the first open place at the end of a column, also of a column that ends early', () => {
    const open = (place: GridPlace) => place.column === 1 && place.unit >= 6;
    expect(walk.afterKeeping(at(8, 0), 'by-characteristic', open)).toEqual(at(6, 1));
    expect(walk.afterKeeping(at(3, 3), 'by-characteristic', open)).toEqual(at(6, 1));
  });

  it('stays where it is when nothing is open any more', () => {
    expect(walk.afterKeeping(at(8, 1), 'by-unit', nothingOpen)).toEqual(at(8, 1));
    expect(walk.afterKeeping(at(3, 3), 'by-characteristic', nothingOpen)).toEqual(at(3, 3));
  });

  it('names no place as open that is not asked', () => {
    expect(walk.firstOpen('by-unit', ({ column }) => column === 2)).toBeNull();
    expect(walk.firstOpen('by-unit', ({ unit }) => unit > 3)).toEqual(at(4, 0));
    expect(walk.firstOpen('by-characteristic', ({ unit, column }) => unit > 3 && column > 0)).toEqual(at(4, 1));
  });
});
