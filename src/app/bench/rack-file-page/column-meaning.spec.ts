import { CHARACTERISTICS } from '../testing/bench-reply';
import { columnMeanings, type Meaning } from './column-meaning';

function meanings(headers: string[], remembered: Record<string, Meaning> = {}, said: Record<string, Meaning> = {}) {
  const known = { characteristics: CHARACTERISTICS, remembered };
  return Object.fromEntries(columnMeanings(headers, new Map(Object.entries(said)), known));
}

describe('what a column of a rack file holds', () => {
  it('is guessed from its heading by key or name, whatever the spelling', () => {
    expect(meanings(['Unit', 'No-load voltage [V]', 'LOADED', 'Temp'])).toEqual({
      Unit: 'unit',
      'No-load voltage [V]': 'no_load',
      LOADED: 'loaded',
    });
  });

  it('is what was remembered with the rack, before any guess', () => {
    expect(meanings(['loaded', 'V2', 'Op'], { V2: 'loaded', Op: null })).toEqual({ V2: 'loaded', Op: null });
  });

  it('is not what was remembered of another plan', () => {
    expect(meanings(['V2'], { V2: 'insulation' })).toEqual({});
  });

  it('is what the person says, before everything else', () => {
    expect(meanings(['loaded', 'V2'], { V2: 'loaded' }, { loaded: null, V2: 'no_load' })).toEqual({
      loaded: null,
      V2: 'no_load',
    });
  });

  it('is never computed', () => {
    expect(meanings(['regulation'])).toEqual({});
  });
});
