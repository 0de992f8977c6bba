import { inputBinding } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Tally } from './tally';
import { type UnitState } from './tally-shapes';

async function show(states: UnitState[], current: number | null = null): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(Tally, {
    bindings: [
      inputBinding('states', () => states),
      inputBinding('current', () => current),
      inputBinding('note', () => '2 more to reject'),
    ],
  });
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('Tally', () => {
  it('says how many are judged, what was found and what is left', async () => {
    const element = await show(['ok', 'major', 'hold', null]);
    expect(element.getAttribute('aria-label')).toBe('2 of 4 judged, major 1, undecided 1, 2 more to reject');
  });

  it('frames the unit that is being measured', async () => {
    expect((await show(['ok', null], 1)).querySelector('.frame')).not.toBeNull();
    expect((await show(['ok', 'ok'])).querySelector('.frame')).toBeNull();
  });

  it('draws the largest sample', async () => {
    const element = await show(Array.from({ length: 500 }, (_, unit) => (unit === 250 ? 'minor' : 'ok')));
    expect(element.querySelectorAll('.spike')).toHaveLength(1);
  });
});
