import { describe, expect, it } from 'vitest';
import { ScopeEntryRefused, scopeVolts, type ScopeEntry, type ScopeField } from '#shared/measurement/scope-reading';

const whole = { form: 'whole', divisions: 3.7, voltsPerDivision: 0.5, probeFactor: 1, coupling: 'ac' } as const;
const halves = {
  form: 'halves',
  upperDivisions: 6.2,
  lowerDivisions: 5.8,
  voltsPerDivision: 0.2,
  probeFactor: 10,
  coupling: 'ac',
} as const;

function refusedField(entry: ScopeEntry, quantity?: 'ripple' | 'level'): ScopeField | 'taken' {
  try {
    scopeVolts(entry, { quantity });
    return 'taken';
  } catch (error) {
    if (error instanceof ScopeEntryRefused) return error.field;
    throw error;
  }
}

describe('a scope reading', () => {
  it('is divisions times volts per division times probe factor', () => {
    expect(scopeVolts(whole)).toBe(1.85);
    expect(scopeVolts({ ...whole, probeFactor: 10 })).toBe(18.5);
  });

  it('of a wave taller than the screen is its two halves added', () => {
    expect(scopeVolts(halves)).toBe(24);
  });

  it('shows no trace of binary arithmetic', () => {
    expect(3 * 0.1).not.toBe(0.3);
    expect(scopeVolts({ ...whole, divisions: 3, voltsPerDivision: 0.1 })).toBe(0.3);
  });

  it('of no visible ripple is 0 V', () => {
    expect(scopeVolts({ ...whole, divisions: 0 })).toBe(0);
  });

  it('of ripple is AC-coupled, of a DC level never', () => {
    expect(refusedField(whole, 'ripple')).toBe('taken');
    expect(refusedField({ ...whole, coupling: 'dc' }, 'ripple')).toBe('coupling');
    expect(refusedField(whole, 'level')).toBe('coupling');
    expect(refusedField({ ...whole, coupling: 'dc' }, 'level')).toBe('taken');
  });

  it('takes a wave as tall as the tallest screen, and no taller', () => {
    expect(refusedField({ ...whole, divisions: 10 })).toBe('taken');
    expect(refusedField({ ...whole, divisions: 10.1 })).toBe('divisions');
    expect(() => scopeVolts({ ...whole, divisions: 12 })).toThrow(/two halves/);
  });

  it.each<[ScopeField, ScopeEntry]>([
    ['divisions', { ...whole, divisions: -1 }],
    ['divisions', { ...whole, divisions: NaN }],
    ['voltsPerDivision', { ...whole, voltsPerDivision: 0 }],
    ['voltsPerDivision', { ...whole, voltsPerDivision: Infinity }],
    ['probeFactor', { ...whole, probeFactor: -10 }],
    ['upperDivisions', { ...halves, upperDivisions: 11 }],
    ['lowerDivisions', { ...halves, lowerDivisions: -0.1 }],
  ])('is refused by its %s', (field, entry) => {
    expect(refusedField(entry)).toBe(field);
  });
});
