import { inputBinding } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { ClassCount } from './class-count';

async function show(given: { found: number; acceptance: number; rejection: number; undecided?: number }) {
  const fixture = TestBed.createComponent(ClassCount, {
    bindings: [
      inputBinding('of', () => 'major'),
      inputBinding('found', () => given.found),
      inputBinding('acceptance', () => given.acceptance),
      inputBinding('rejection', () => given.rejection),
      inputBinding('undecided', () => given.undecided ?? 0),
    ],
  });
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  return { element, text: element.textContent.replaceAll(/\s+/g, ' ') };
}

describe('ClassCount', () => {
  it('says how many more nonconforming units reject the lot', async () => {
    const { text } = await show({ found: 1, acceptance: 2, rejection: 3 });
    expect(text).toContain('Ac 2 · Re 3');
    expect(text).toContain('2 more to reject');
    expect(text).toContain('1 found');
  });

  it('says that the rejection number is reached, and no negative rest', async () => {
    const { element, text } = await show({ found: 4, acceptance: 2, rejection: 3 });
    expect(text).toContain('0 reject number reached');
    expect(element.classList).toContain('hit');
  });

  it('never counts an undecided unit as found', async () => {
    const { text } = await show({ found: 1, acceptance: 2, rejection: 3, undecided: 2 });
    expect(text).toContain('1 found');
    expect(text).toContain('2 undecided');
  });

  it('fills one slot per unit found; the stop is the last', async () => {
    const { element } = await show({ found: 2, acceptance: 5, rejection: 6 });
    expect(element.querySelectorAll('.pip')).toHaveLength(5);
    expect(element.querySelectorAll('.pip.full')).toHaveLength(2);
    expect(element.querySelector('.stop.full')).toBeNull();
  });

  it('draws a bar instead of more than twelve slots', async () => {
    const { element } = await show({ found: 11, acceptance: 21, rejection: 22 });
    expect(element.querySelectorAll('.pip')).toHaveLength(2);
  });
});
