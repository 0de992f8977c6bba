import { tallyShapes, type UnitState } from './tally-shapes';

const units = (count: number, state: UnitState) => Array.from({ length: count }, () => state);
const kinds = (states: UnitState[], width: number) => tallyShapes(states, width).map(({ kind }) => kind);

describe('the shapes of a tally', () => {
  it('are one cell per unit while there is room', () => {
    expect(kinds(['ok', 'ok', null], 300)).toEqual(['ok', 'ok', 'open']);
  });

  it('close to one bar and one line where units are narrower than a cell', () => {
    expect(kinds([...units(300, 'ok'), ...units(200, null)], 500)).toEqual(['ok', 'open-line']);
  });

  it('rise with the class of the nonconforming unit', () => {
    const [minor, major, critical] = tallyShapes(['minor', 'major', 'critical'], 300).map(({ height }) => height);
    expect(minor).toBeLessThan(major ?? 0);
    expect(major).toBeLessThan(critical ?? 0);
  });

  it('keep a spike at least 3 px wide, whatever the number of units', () => {
    const spike = tallyShapes([...units(499, 'ok'), 'minor'], 400).find(({ kind }) => kind === 'spike');
    expect(spike?.width).toBe(3);
  });

  it('draw a unit on hold as a diamond, not as a spike', () => {
    expect(kinds(['hold'], 100)).toEqual(['hold']);
  });

  it('stay within the width', () => {
    const shapes = tallyShapes(units(137, 'ok'), 480);
    expect(Math.max(...shapes.map(({ x, width }) => x + width))).toBeLessThanOrEqual(480);
  });
});
