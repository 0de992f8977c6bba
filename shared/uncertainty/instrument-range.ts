/** Units that an instrument range reads; SI base units. */
export type RangeUnit = 'V' | 'A' | 'Ω' | 'W' | 'Hz' | 's' | 'K' | 'F' | 'm';

/** A range with digits: accuracy ±(share of reading + share of range + counts); SI base units, shares as fractions. */
export interface DigitalRange {
  id: number;
  form: 'digital';
  name: string;
  unit: RangeUnit;
  fullScale: number;
  /** What one count is worth. */
  resolution: number;
  ofReading: number;
  ofRange: number;
  counts: number;
}

/** The vertical scale of a screen that is read by its graticule; its full scale is the screen's height. */
export interface GraticuleRange {
  id: number;
  form: 'graticule';
  name: string;
  unit: 'V';
  screenDivisions: number;
  ofReading: number;
  ofFullScale: number;
  /** The step to which a height is read, in divisions: half a minor division is 0.1. */
  readingStep: number;
}

/** A range of an instrument with its accuracy specification. */
export type InstrumentRange = DigitalRange | GraticuleRange;
