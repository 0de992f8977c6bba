import { type Limits, type Scale } from './strip-scale';

/** A stretch of a strip, in px from its left end. */
export interface Stretch {
  readonly x: number;
  readonly width: number;
}

/** Where the parts of a limit strip lie, in px from the left. */
export interface StripGeometry {
  /** Between the limits, and the part of it that is left after the guard bands. */
  readonly band: Stretch;
  readonly accept: Stretch;
  readonly limits: readonly number[];
  /** Centre of the reading, clamped to the strip; null without a reading. */
  readonly reading: number | null;
  /** On which side the reading leaves the scale. */
  readonly beyond: 'low' | 'high' | null;
  /** Plus and minus the expanded uncertainty about the reading, clipped at the ends. */
  readonly whisker: Stretch | null;
}

/** Lays out a strip of `width` px; the reading keeps `margin` px from the ends. */
export function stripGeometry(strip: {
  limits: Limits;
  scale: Scale;
  value: number | null;
  /** Half-length of the whisker. */
  uncertainty: number;
  /** Width of the guard bands. */
  guard: number;
  width: number;
  margin: number;
  leastGuard: number;
}): StripGeometry {
  const { limits, scale, value, uncertainty, width, margin } = strip;
  const pxPerUnit = width / (scale.max - scale.min);
  const at = (quantity: number) => (quantity - scale.min) * pxPerUnit;
  const start = limits.lower === null ? 0 : clamp(at(limits.lower), 0, width);
  const end = limits.upper === null ? width : clamp(at(limits.upper), 0, width);
  const guard = Math.min(Math.max(strip.guard * pxPerUnit, strip.leastGuard), (end - start) / 2);
  const acceptStart = start + (limits.lower === null ? 0 : guard);
  const acceptEnd = end - (limits.upper === null ? 0 : guard);
  const reading = value === null ? null : at(value);
  return {
    band: stretch(start, end),
    accept: stretch(acceptStart, acceptEnd),
    limits: [limits.lower, limits.upper].filter((limit) => limit !== null).map(at),
    reading: reading === null ? null : clamp(reading, margin, width - margin),
    beyond: beyondScale(reading, width),
    whisker: reading === null ? null : whiskerAbout(reading, uncertainty * pxPerUnit, width),
  };
}

function beyondScale(reading: number | null, width: number): 'low' | 'high' | null {
  if (reading === null) return null;
  if (reading < 0) return 'low';
  return reading > width ? 'high' : null;
}

function whiskerAbout(reading: number, half: number, width: number): Stretch | null {
  const start = clamp(reading - half, 0, width);
  const end = clamp(reading + half, 0, width);
  return end > start ? stretch(start, end) : null;
}

function stretch(start: number, end: number): Stretch {
  return { x: start, width: Math.max(0, end - start) };
}

function clamp(value: number, least: number, most: number): number {
  return Math.min(Math.max(value, least), most);
}
