import { type CalibrationBody, type CalibrationPoint } from '#shared/contract/calibrations';
import { type InstrumentKind } from '#shared/contract/instruments';
import { type Chance } from './chance';
import { type DemoInstrument } from './demo-instruments';

type Point = Omit<CalibrationPoint, 'found'>;

/** What a laboratory applies to instruments of each kind; SI base units. The demo's own figures, from no source. */
const POINTS: Record<InstrumentKind, readonly Point[]> = {
  oscilloscope: [
    { point: '0.5 V/div, 3 V p-p', unit: 'V', reference: 3, limit: 0.09 },
    { point: '0.2 V/div, 1.2 V p-p', unit: 'V', reference: 1.2, limit: 0.036 },
    { point: '20 mV/div, 120 mV p-p', unit: 'V', reference: 0.12, limit: 0.0036 },
  ],
  multimeter: [
    { point: 'DC 10 V', unit: 'V', reference: 10, limit: 0.0023 },
    { point: 'DC 1 V', unit: 'V', reference: 1, limit: 0.00023 },
  ],
  'electronic-load': [{ point: '1 A', unit: 'A', reference: 1, limit: 0.002 }],
  'insulation-tester': [{ point: '100 MΩ at 500 V', unit: 'Ω', reference: 1e8, limit: 1e7 }],
  'power-meter': [{ point: '10 W', unit: 'W', reference: 10, limit: 0.11 }],
  thermometer: [{ point: '50 °C', unit: 'K', reference: 323.15, limit: 1 }],
  rule: [{ point: '1 m', unit: 'm', reference: 1, limit: 0.0005 }],
};

/** How far the oscilloscope that was out of tolerance was off, as a share of what was applied. */
const GAIN_ERROR = 0.052;
/** A sound instrument is found within this share of what it may be off. */
const SOUND = 0.55;

/** A calibration of the demo, by its days from the last day of the year. */
export interface DemoCalibration {
  inDays: number;
  dueInDays: number;
  isOut: boolean;
}

/**
 * The calibrations of an instrument, oldest first: one before the year begins, and all within it.
 *
 * @param beginsInDays when the year begins, a negative number
 */
export function demoCalibrations(
  { dueInDays, everyDays, isOutAtLast }: DemoInstrument,
  beginsInDays: number,
): DemoCalibration[] {
  const calibrations: DemoCalibration[] = [];
  for (let due = dueInDays; ; due -= everyDays) {
    calibrations.unshift({ inDays: due - everyDays, dueInDays: due, isOut: isOutAtLast && due === dueInDays });
    if (due - everyDays <= beginsInDays) return calibrations;
  }
}

/** What the laboratory states. */
export function demoCertificate(
  kind: InstrumentKind,
  { isOut }: DemoCalibration,
  days: { calibratedOn: string; dueOn: string },
  chance: Chance,
): CalibrationBody {
  const points = POINTS[kind].map((point) => {
    const error = isOut ? point.reference * GAIN_ERROR : point.limit * chance.between(-SOUND, SOUND);
    return { ...point, found: Number((point.reference + error).toPrecision(6)) };
  });
  return {
    ...days,
    laboratory: 'Weir Lane Calibration',
    certificateNumber: `WL-${chance.whole(10_000, 99_999)}`,
    asFound: isOut ? 'out-of-tolerance' : 'in-tolerance',
    adjusted: isOut,
    points,
    note: isOut ? 'Gain of both channels adjusted after the as-found readings.' : '',
  };
}
