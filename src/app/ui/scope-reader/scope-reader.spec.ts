import { inputBinding, outputBinding, signal, twoWayBinding } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { type ExpectedBand } from '#shared/measurement/plausibility';
import { type AlternatePeaks } from '#shared/measurement/scope-reading';
import { ScopeReader } from './scope-reader';
import { EMPTY_SCOPE, type ScopeOutcome, type ScopeText } from './scope-text';

const BAND: ExpectedBand = { low: 1.5, high: 2.3 };

function setUp(
  entry: Partial<ScopeText> = {},
  given: { expected?: ExpectedBand; alternatePeaks?: AlternatePeaks } = {},
) {
  const { expected = null, alternatePeaks = 'worst' } = given;
  const text = signal<ScopeText>({ ...EMPTY_SCOPE, ...entry });
  const outcomes: ScopeOutcome[] = [];
  let kept = 0;
  const fixture = TestBed.createComponent(ScopeReader, {
    bindings: [
      twoWayBinding('entry', text),
      inputBinding('expected', () => expected),
      inputBinding('alternatePeaks', () => alternatePeaks),
      inputBinding('model', () => 'No rectifier model for this part.'),
      outputBinding<ScopeOutcome>('read', (outcome) => outcomes.push(outcome)),
      outputBinding('kept', () => (kept += 1)),
    ],
  });
  const element = fixture.nativeElement as HTMLElement;
  const boxes = () => [...element.querySelectorAll<HTMLInputElement>('.fields input')];
  const type = async (index: number, value: string) => {
    const box = boxes()[index];
    if (box === undefined) throw new Error(`No field ${index}`);
    box.value = value;
    box.dispatchEvent(new Event('input'));
    await fixture.whenStable();
  };
  const press = async (key: string) => {
    boxes()[0]?.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true }));
    await fixture.whenStable();
  };
  const result = () => element.querySelector('.result b')?.textContent;
  return { fixture, element, text, outcomes, boxes, type, press, result, kept: () => kept };
}

describe('ScopeReader', () => {
  it('shows the product of height, scale and probe at every key', async () => {
    const reader = setUp({ voltsPerDivision: '0.5' });
    await reader.fixture.whenStable();
    await reader.type(0, '3.7');
    expect(reader.result()).toBe('1.85');
    await reader.type(2, '10');
    expect(reader.result()).toBe('18.50');
    expect(reader.outcomes.at(-1)).toMatchObject({ kind: 'read', volts: 18.5 });
  });

  it('adds the two halves of a wave taller than the screen', async () => {
    const reader = setUp({ form: 'halves', upperDivisions: '4.9', lowerDivisions: '4.6', voltsPerDivision: '0.2' });
    await reader.fixture.whenStable();
    expect(reader.boxes()).toHaveLength(4);
    expect(reader.result()).toBe('1.90');
  });

  it('is empty until a height is typed, which is no fault', async () => {
    const reader = setUp({ voltsPerDivision: '0.5' });
    await reader.fixture.whenStable();
    expect(reader.element.querySelector('.result .empty')?.textContent).toBe('0.00');
    expect(reader.element.querySelector('.refused')).toBeNull();
  });

  it('tells in words which field is missing', async () => {
    const reader = setUp();
    await reader.fixture.whenStable();
    await reader.type(0, '3');
    expect(reader.outcomes.at(-1)).toMatchObject({ kind: 'refused', field: 'voltsPerDivision' });
    expect(reader.element.textContent).toContain('Volts per division');
  });

  it('refuses ripple that was read DC-coupled', async () => {
    const reader = setUp({ divisions: '3', voltsPerDivision: '0.5', coupling: 'dc' });
    await reader.fixture.whenStable();
    expect(reader.element.textContent).toContain('Set the channel to AC');
  });

  it('says that the part has no model', async () => {
    const reader = setUp({ divisions: '3', voltsPerDivision: '0.5' });
    await reader.fixture.whenStable();
    expect(reader.element.textContent).toContain('No rectifier model for this part.');
  });

  it('names a slip by ten and mends it with F2', async () => {
    const reader = setUp({ divisions: '9.5', voltsPerDivision: '0.2', probeFactor: '10' }, { expected: BAND });
    await reader.fixture.whenStable();
    expect(reader.element.textContent).toContain('Ten times what the model gives.');
    expect(reader.element.textContent).toContain('Look at the switch on the probe.');
    await reader.press('F2');
    expect(reader.text().probeFactor).toBe('1');
    expect(reader.result()).toBe('1.90');
    expect(reader.element.textContent).toContain('Agrees with the rectifier model.');
  });

  it('mends a slip by a thousand at the prefix of the scale', async () => {
    const reader = setUp({ divisions: '9.5', voltsPerDivision: '200' }, { expected: BAND });
    await reader.fixture.whenStable();
    await reader.press('F2');
    expect(reader.text().voltsPerDivision).toBe('0.2');
  });

  it('mends a neighbouring step of the scale, and only to a step that scales have', async () => {
    const reader = setUp({ divisions: '9.5', voltsPerDivision: '0.5' }, { expected: BAND });
    await reader.fixture.whenStable();
    await reader.press('F2');
    expect(reader.text().voltsPerDivision).toBe('0.2');
    expect(reader.result()).toBe('1.90');
  });

  it('offers no cure where no slip would explain the value', async () => {
    const reader = setUp({ divisions: '1.4', voltsPerDivision: '0.05' }, { expected: { low: 1.9, high: 2.1 } });
    await reader.fixture.whenStable();
    expect(reader.element.textContent).toContain('27 times less than the model.');
    expect(reader.element.querySelector('button.link')).toBeNull();
  });

  it('lets the higher of two alternate peaks count, or their mean, as the plan says', async () => {
    const peaks = { form: 'alternate', higherDivisions: '4', lowerDivisions: '3', voltsPerDivision: '0.5' } as const;
    const worst = setUp(peaks);
    await worst.fixture.whenStable();
    expect(worst.result()).toBe('2.00');
    expect(worst.element.textContent).toContain('The higher peak counts.');
    const mean = setUp(peaks, { alternatePeaks: 'mean' });
    await mean.fixture.whenStable();
    expect(mean.result()).toBe('1.75');
    expect(mean.element.textContent).toContain('The mean of both peaks counts.');
  });

  it('keeps with Enter from any field', async () => {
    const reader = setUp({ divisions: '3', voltsPerDivision: '0.5' });
    await reader.fixture.whenStable();
    reader.boxes()[1]?.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter', bubbles: true }));
    expect(reader.kept()).toBe(1);
  });
});
