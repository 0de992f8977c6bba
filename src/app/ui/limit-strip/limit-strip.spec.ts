import { inputBinding, type Binding } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { type VerdictLook } from '../verdict-look';
import { LimitStrip } from './limit-strip';

async function show(
  given: { value: number | null; lower: number | null; upper: number | null; verdict: VerdictLook },
  more: Binding[] = [],
): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(LimitStrip, {
    bindings: [
      inputBinding('value', () => given.value),
      inputBinding('lower', () => given.lower),
      inputBinding('upper', () => given.upper),
      inputBinding('verdict', () => given.verdict),
      inputBinding('unit', () => 'V'),
      ...more,
    ],
  });
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}
const words = (element: HTMLElement) => element.getAttribute('aria-label')?.replaceAll('\u00a0', ' ');

describe('LimitStrip', () => {
  it('says reading, limit and verdict in one sentence', async () => {
    const element = await show({ value: 1.85, lower: null, upper: 2.4, verdict: 'ok' });
    expect(element.getAttribute('role')).toBe('img');
    expect(words(element)).toBe('1.85 V, upper limit 2.40 V, conforming');
  });

  it('names both limits', async () => {
    const element = await show({ value: 13.1, lower: 11.4, upper: 12.9, verdict: 'nok' });
    expect(words(element)).toBe('13.10 V, limits 11.40 V to 12.90 V, nonconforming');
  });

  it('says that there is no reading yet', async () => {
    const element = await show({ value: null, lower: 100, upper: null, verdict: 'open' });
    expect(words(element)).toBe('No reading, lower limit 100.00 V');
    expect(element.querySelector('.tick, .square, .diamond')).toBeNull();
  });

  it('marks each verdict by its own shape', async () => {
    const limits = { lower: 11, upper: 13 };
    expect((await show({ value: 12, ...limits, verdict: 'ok' })).querySelector('.tick')).not.toBeNull();
    expect((await show({ value: 12.9, ...limits, verdict: 'hold' })).querySelector('.diamond')).not.toBeNull();
    expect((await show({ value: 13.2, ...limits, verdict: 'nok' })).querySelector('.square')).not.toBeNull();
  });

  it('points off the scale instead of drawing a mark beyond it', async () => {
    const element = await show({ value: 40, lower: 11, upper: 13, verdict: 'nok' });
    expect(element.querySelector('.beyond.nok')).not.toBeNull();
    expect(element.querySelector('.square')).toBeNull();
  });

  it('labels reading and limits in a panel', async () => {
    const element = await show({ value: 2.61, lower: null, upper: 2.4, verdict: 'nok' }, [
      inputBinding('size', () => 'panel'),
      inputBinding('expected', () => [1.5, 2.3]),
    ]);
    expect(element.querySelector('.reading')?.textContent).toBe('2.61');
    expect(element.querySelector('.limit-label')?.textContent).toBe('max 2.40\u00a0V');
    expect(element.querySelector('.bracket')).not.toBeNull();
  });
});
