import { WaveWindow } from './wave-window';

describe('WaveWindow', () => {
  const window = (samples = 1_000_000) => new WaveWindow(() => samples);

  it('begins with the whole, and comes back to it', () => {
    const shown = window();
    expect(shown.isWhole()).toBe(true);
    shown.zoom('in');
    expect(shown.share()).toEqual({ from: 0.25, to: 0.75 });
    expect(shown.isWhole()).toBe(false);
    shown.zoom('out');
    expect(shown.share()).toEqual({ from: 0, to: 1 });
  });

  it('moves by a quarter of what is shown, and stops at the ends with its width', () => {
    const shown = window();
    shown.zoom('in');
    shown.move('right');
    expect(shown.share()).toEqual({ from: 0.375, to: 0.875 });
    shown.move('right');
    shown.move('right');
    expect(shown.share()).toEqual({ from: 0.5, to: 1 });
    for (let step = 0; step < 9; step += 1) shown.move('left');
    expect(shown.share()).toEqual({ from: 0, to: 0.5 });
  });

  it('never shows fewer samples than can be told apart', () => {
    const shown = window(320);
    for (let step = 0; step < 20; step += 1) shown.zoom('in');
    expect(shown.share().to - shown.share().from).toBeCloseTo(0.1, 12);
    const few = window(10);
    few.zoom('in');
    expect(few.isWhole()).toBe(true);
  });
});
