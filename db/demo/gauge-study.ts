import { type GaugeStudyBody } from '#shared/contract/gauge-studies';
import { shiftDecimal } from '#shared/quantities/shift-decimal';
import { chanceOf, type Chance } from './chance';
import { demoPart } from './demo-parts';
import { productionOf } from './production';
import { type SupplyOutput, supplyUnit } from './supply-model';

/** How an instrument and the people at it read one thing of a unit; spreads in SI base units, at the size given. */
interface Reading {
  of: (unit: SupplyOutput) => number;
  /** How far two readings by the same person differ. */
  repeatability: number;
  /** Share of the reading by which a person reads high or low. */
  habit: number;
  /** How finely it is read. */
  step: number;
}

type StudyWords = Pick<
  GaugeStudyBody,
  'title' | 'quantity' | 'unit' | 'decimals' | 'lowerLimit' | 'upperLimit' | 'note'
>;

const PART = 'WA-12-500';
const UNITS = 10;
const TRIALS = 3;
const { loadedVolts, rippleVolts } = demoPart(PART).limits;

/** The multimeter: probes at the terminals, the line holding still to a few millivolts. */
const METER: Reading = { of: (unit) => unit.loadedVolts, repeatability: 0.004, habit: 0.0003, step: 3 };
const METER_WORDS: StudyWords = {
  title: `Loaded voltage of ${PART} by multimeter`,
  quantity: 'Loaded voltage',
  unit: 'V',
  decimals: 3,
  lowerLimit: loadedVolts[0],
  upperLimit: loadedVolts[1],
  note:
    'Units at full load for 60 s before the first reading; probes lifted between trials. ' +
    'The order of the units is drawn anew for each trial.',
};

/** The oscilloscope: a height read to a tenth of a division, by eye. */
const SCOPE: Reading = { of: (unit) => unit.rippleVolts, repeatability: 0.03, habit: 0.012, step: 2 };
const SCOPE_WORDS: StudyWords = {
  title: `Ripple of ${PART} read off the screen`,
  quantity: 'Ripple at full load',
  unit: 'V p-p',
  decimals: 2,
  lowerLimit: null,
  upperLimit: rippleVolts,
  note: '',
};

/** One study of the demo; which kind it is says what was measured, and with what. */
export type DemoStudy = 'meter' | 'scope';

const STUDIES = { meter: [METER, METER_WORDS], scope: [SCOPE, SCOPE_WORDS] } as const;

function readings(reading: Reading, persons: readonly string[], chance: Chance): number[][][] {
  const { model } = demoPart(PART).body;
  const production = productionOf('none', chance);
  const habits = persons.map(() => 1 + chance.about(0, reading.habit));
  return Array.from({ length: UNITS }, () => {
    const truth = reading.of(supplyUnit(model, production, chance));
    return habits.map((habit) =>
      Array.from({ length: TRIALS }, () => {
        const read = chance.about(truth * habit, reading.repeatability);
        return shiftDecimal(Math.round(shiftDecimal(read, reading.step)), -reading.step);
      }),
    );
  });
}

/** A gauge study of ten units, each read three times by each person; the same seed gives the same readings. */
export function demoGaugeStudy(
  kind: DemoStudy,
  { instrumentId, persons, seed }: { instrumentId: number; persons: readonly string[]; seed: number },
): GaugeStudyBody {
  const [reading, words] = STUDIES[kind];
  return {
    ...words,
    instrumentId,
    parts: Array.from({ length: UNITS }, (_, nth) => `Unit ${String(nth + 1)}`),
    persons: [...persons],
    trials: TRIALS,
    values: readings(reading, persons, chanceOf(seed)),
  };
}

/** The same study before its last person has come to the later units, whose readings are still missing. */
export function unfinished(study: GaugeStudyBody, from: number): GaugeStudyBody {
  const last = study.persons.length - 1;
  const values = study.values.map((rows, part) =>
    rows.map((cell, person) => (part >= from && person === last ? cell.map(() => null) : cell)),
  );
  return { ...study, values };
}
