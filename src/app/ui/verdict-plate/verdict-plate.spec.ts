import { inputBinding } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { plateTrace, type PlateVariant } from './plate-trace';
import { VerdictPlate } from './verdict-plate';

async function show(variant: PlateVariant, word = ''): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(VerdictPlate, {
    bindings: [
      inputBinding('variant', () => variant),
      inputBinding('word', () => word),
      inputBinding('bottomLeft', () => 'Major 3, Re 3'),
    ],
  });
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('VerdictPlate', () => {
  it('says the verdict in one word', async () => {
    expect((await show('rejected')).querySelector('.word')?.textContent).toBe('REJECTED');
    expect((await show('on-hold')).querySelector('.word')?.textContent).toBe('ON HOLD');
  });

  it('gives its reason', async () => {
    expect((await show('rejected')).textContent).toContain('Major 3, Re 3');
  });

  it('interrupts with STOP, and waits its turn with everything else', async () => {
    expect((await show('stop')).querySelector('.word')?.getAttribute('aria-live')).toBe('assertive');
    expect((await show('continue')).querySelector('.word')?.getAttribute('aria-live')).toBe('polite');
  });

  it('draws a line of its own for each outline', () => {
    const lines = (['accepted', 'rejected', 'on-hold', 'continue'] as const).map((variant) =>
      plateTrace(variant, 300)
        .map(({ d }) => d)
        .join(),
    );
    expect(new Set(lines).size).toBe(4);
    expect(plateTrace('stop', 300)).toEqual(plateTrace('rejected', 300));
  });
});
