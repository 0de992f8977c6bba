import { type GridMove } from './grid-walk';

/** A key as pressed in the grid. */
export interface KeyPress {
  readonly key: string;
  readonly ctrl: boolean;
  readonly shift: boolean;
  readonly alt: boolean;
}

/** What a key asks of the bench. */
export type BenchCommand =
  | { readonly does: 'type'; readonly text: string }
  | { readonly does: 'move'; readonly move: GridMove }
  | {
      readonly does:
        | 'keep'
        | 'next'
        | 'previous'
        | 'pass'
        | 'fail'
        | 'edit'
        | 'escape'
        | 'note'
        | 'repeat'
        | 'set-aside'
        | 'conditions'
        | 'withdraw'
        | 'all-keys';
    };

const MOVES: ReadonlyMap<string, GridMove> = new Map([
  ['ArrowUp', 'up'],
  ['ArrowDown', 'down'],
  ['ArrowLeft', 'left'],
  ['ArrowRight', 'right'],
  ['Home', 'row-start'],
  ['End', 'row-end'],
  ['PageUp', 'page-up'],
  ['PageDown', 'page-down'],
]);

const CONTROL: ReadonlyMap<string, BenchCommand> = new Map([
  ['home', { does: 'move', move: 'first' }],
  ['end', { does: 'move', move: 'last' }],
  ['z', { does: 'withdraw' }],
]);

const PLAIN: ReadonlyMap<string, BenchCommand> = new Map([
  ['Enter', { does: 'keep' }],
  ['F2', { does: 'edit' }],
  ['Escape', { does: 'escape' }],
]);

const LETTERS: ReadonlyMap<string, BenchCommand> = new Map([
  ['p', { does: 'pass' }],
  ['f', { does: 'fail' }],
  ['n', { does: 'note' }],
  ['r', { does: 'repeat' }],
  ['h', { does: 'set-aside' }],
  ['c', { does: 'conditions' }],
  ['?', { does: 'all-keys' }],
]);

/** What starts a number: a digit, a decimal point or comma, a sign. */
const STARTS_A_NUMBER = /^[0-9.,+\-\u2212]$/;

/**
 * What a key pressed in the measuring grid asks for, or null for a key that is none of the bench's. Digits, point, comma and
 * sign start a reading; single letters act only while `letters` is on.
 */
export function benchCommand(press: KeyPress, letters: boolean): BenchCommand | null {
  const { key, ctrl, shift, alt } = press;
  if (alt) return null;
  if (ctrl) return CONTROL.get(key.toLowerCase()) ?? null;
  if (key === 'Tab') return { does: shift ? 'previous' : 'next' };
  const move = MOVES.get(key);
  if (move !== undefined) return shift ? null : { does: 'move', move };
  if (STARTS_A_NUMBER.test(key)) return { does: 'type', text: key };
  return PLAIN.get(key) ?? (letters ? LETTERS.get(key.toLowerCase()) : undefined) ?? null;
}
