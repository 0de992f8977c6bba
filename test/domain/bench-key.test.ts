import { describe, expect, it } from 'vitest';
import { benchCommand } from '#shared/bench/bench-key';

const press = (key: string, held: { ctrl?: boolean; shift?: boolean; alt?: boolean } = {}) => ({
  key,
  ctrl: held.ctrl ?? false,
  shift: held.shift ?? false,
  alt: held.alt ?? false,
});

describe('the keys of the bench', () => {
  it.each(['0', '7', '.', ',', '-', '\u2212'])('starts a reading with %s', (key) => {
    expect(benchCommand(press(key), true)).toEqual({ does: 'type', text: key });
  });

  it.each([
    ['Enter', 'keep'],
    ['F2', 'edit'],
    ['Escape', 'escape'],
    ['p', 'pass'],
    ['F', 'fail'],
    ['n', 'note'],
    ['r', 'repeat'],
    ['h', 'set-aside'],
    ['?', 'all-keys'],
  ])('%s asks to %s', (key, does) => {
    expect(benchCommand(press(key), true)).toEqual({ does });
  });

  it('goes to the next characteristic with Tab and back with Shift and Tab', () => {
    expect(benchCommand(press('Tab'), true)).toEqual({ does: 'next' });
    expect(benchCommand(press('Tab', { shift: true }), true)).toEqual({ does: 'previous' });
  });

  it('tells Home from Ctrl and Home', () => {
    expect(benchCommand(press('Home'), true)).toEqual({ does: 'move', move: 'row-start' });
    expect(benchCommand(press('Home', { ctrl: true }), true)).toEqual({ does: 'move', move: 'first' });
  });

  it('withdraws the last kept reading with Ctrl and Z, also while Caps Lock is on', () => {
    expect(benchCommand(press('z', { ctrl: true }), true)).toEqual({ does: 'withdraw' });
    expect(benchCommand(press('Z', { ctrl: true }), true)).toEqual({ does: 'withdraw' });
  });

  it('does nothing on single letters once they are switched off, but still takes numbers and Enter', () => {
    expect(benchCommand(press('p'), false)).toBeNull();
    expect(benchCommand(press('?'), false)).toBeNull();
    expect(benchCommand(press('4'), false)).toEqual({ does: 'type', text: '4' });
    expect(benchCommand(press('Enter'), false)).toEqual({ does: 'keep' });
  });

  it('leaves the keys of the browser and of the line alone', () => {
    expect(benchCommand(press('2', { alt: true }), true)).toBeNull();
    expect(benchCommand(press('r', { ctrl: true }), true)).toBeNull();
    expect(benchCommand(press('/'), true)).toBeNull();
    expect(benchCommand(press('constructor'), true)).toBeNull();
  });
});
