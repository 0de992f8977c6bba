/** What the tally shows of one unit: conforming, its worst class when nonconforming, on hold, or not judged. */
export type UnitState = 'ok' | 'minor' | 'major' | 'critical' | 'hold' | null;

/** One drawn piece of the tally, in px from its top left. */
export interface TallyShape {
  readonly kind: 'ok' | 'open' | 'open-line' | 'spike' | 'hold';
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** Top of the base line's cells, and their height. */
export const BASE = 30;
export const CELL = 8;
/** Below this pitch the gaps close: a run of conforming units is one bar, unjudged units are a line. */
const LEAST_PITCH = 3.2;
/** Heights of the spikes, in the order of the class glyph. */
const SPIKES = { minor: 16, major: 25, critical: 36 } as const;

/** Pitch of the units on a tally of `width` px. */
export function pitchOf(units: number, width: number): number {
  return width / Math.max(units, 1);
}

/** The pieces of a tally: cells or runs along the base line, spikes and diamonds on them. */
export function tallyShapes(states: readonly UnitState[], width: number): TallyShape[] {
  const pitch = pitchOf(states.length, width);
  const cells = pitch >= LEAST_PITCH ? singleCells(states, pitch) : runs(states, pitch);
  const marks = states.flatMap((state, unit) => markOf(state, unit, pitch));
  return [...cells, ...marks];
}

function singleCells(states: readonly UnitState[], pitch: number): TallyShape[] {
  const width = pitch - 1;
  return states.flatMap((state, unit): TallyShape[] => {
    if (state === 'ok') return [{ kind: 'ok', x: unit * pitch, y: BASE, width, height: CELL }];
    if (state !== null) return [];
    return [{ kind: 'open', x: unit * pitch + 0.5, y: BASE + 0.5, width: Math.max(width - 1, 0.3), height: CELL - 1 }];
  });
}

function runs(states: readonly UnitState[], pitch: number): TallyShape[] {
  const shapes: TallyShape[] = [];
  let start = 0;
  states.forEach((state, unit) => {
    const next = states[unit + 1];
    if (unit + 1 < states.length && (next === null) === (state === null)) return;
    const run = { x: start * pitch, width: (unit + 1 - start) * pitch };
    shapes.push(
      state === null
        ? { kind: 'open-line', ...run, y: BASE + 3, height: 2 }
        : { kind: 'ok', ...run, y: BASE, height: CELL },
    );
    start = unit + 1;
  });
  return shapes;
}

function markOf(state: UnitState, unit: number, pitch: number): TallyShape[] {
  if (state === null || state === 'ok') return [];
  const cell = Math.max(pitch - (pitch >= LEAST_PITCH ? 1 : 0), 0.8);
  const centre = unit * pitch + cell / 2;
  if (state === 'hold') {
    const half = Math.min(Math.max(cell / 2, 4), 7);
    return [{ kind: 'hold', x: centre - half, y: BASE - 3, width: 2 * half, height: 14 }];
  }
  const width = Math.max(cell, 3);
  const height = SPIKES[state];
  return [{ kind: 'spike', x: centre - width / 2, y: BASE + CELL - height, width, height }];
}
