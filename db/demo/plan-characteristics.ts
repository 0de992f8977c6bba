import { type Characteristic } from '#shared/contract/plans';
import { HOT_CAUTION, INSULATION_CAUTION, MAINS_CAUTION, OPEN_FRAME_CAUTION, SCOPE_CAUTION } from './cautions';
import { type Computed, FEW_UNITS, type Measured, MEASURED, PLAIN, UNLIMITED } from './characteristic-parts';
import { type DemoPart } from './demo-part';
import { balance, currentLimit, noLoadPower } from './special-characteristics';

type Attribute = Extract<Characteristic, { kind: 'attribute' }>;

function isOpenFrame({ body }: DemoPart): boolean {
  return body.form === 'open-frame';
}

function voltsCaution(part: DemoPart): string {
  return isOpenFrame(part) ? OPEN_FRAME_CAUTION : MAINS_CAUTION;
}

function loadText({ body }: DemoPart): string {
  const { ratedAmperes } = body.model;
  return ratedAmperes < 1 ? `at ${Math.round(ratedAmperes * 1000)} mA` : `at ${ratedAmperes} A`;
}

function marking(): Attribute {
  return {
    kind: 'attribute',
    ...PLAIN,
    key: 'marking',
    name: 'Marking and labels',
    class: 'minor',
    method: 'Read the rating label and the date code at arm’s length. Wipe once with a dry cloth and read again.',
    requirement: 'Legible, complete',
    failReasons: ['Smeared', 'Rating line missing', 'Wrong date code', 'Label loose'],
    instrumentKind: null,
  };
}

function polarity(part: DemoPart): Attribute {
  return {
    kind: 'attribute',
    ...PLAIN,
    key: 'polarity',
    name: 'Polarity',
    class: 'critical',
    method: 'Meter on the output, red lead on plus. The sign on the meter decides.',
    caution: voltsCaution(part),
    requirement: isOpenFrame(part) ? 'Plus on terminal 1' : 'Centre positive',
    failReasons: ['Reversed', 'No output'],
    instrumentKind: 'multimeter',
  };
}

function insulation(): Measured {
  return {
    kind: 'measured',
    ...MEASURED,
    ...UNLIMITED,
    key: 'insulation',
    measurand: 'insulation-resistance',
    name: 'Insulation, in to out',
    class: 'critical',
    condition: 'at 500 V DC',
    method: 'Both mains pins joined against both output poles, 500 V DC for 5 s. Write down the lowest value shown.',
    caution: INSULATION_CAUTION,
    unit: 'MΩ',
    decimals: 0,
    lowerLimit: 100e6,
    entryMode: 'direct',
    instrumentKind: 'insulation-tester',
  };
}

function noLoad(part: DemoPart): Measured {
  const [lowerLimit, upperLimit] = part.limits.noLoadVolts;
  return {
    kind: 'measured',
    ...MEASURED,
    key: 'v_no_load',
    measurand: 'no-load-voltage',
    name: 'No-load voltage',
    class: 'major',
    condition: '230 V, no load',
    method: 'Warm up for 30 s without load. Read the mean value.',
    caution: voltsCaution(part),
    unit: 'V',
    decimals: 2,
    target: null,
    lowerLimit,
    upperLimit,
    entryMode: 'direct',
    instrumentKind: 'multimeter',
  };
}

function loaded(part: DemoPart): Measured {
  const [lowerLimit, upperLimit] = part.limits.loadedVolts;
  return {
    kind: 'measured',
    ...MEASURED,
    key: 'v_loaded',
    measurand: 'loaded-voltage',
    name: 'Loaded voltage',
    class: 'major',
    condition: loadText(part),
    method: 'Electronic load at constant current for 60 s. Read at the terminals, not at the load.',
    caution: voltsCaution(part),
    unit: 'V',
    decimals: 2,
    target: part.body.model.ratedVolts,
    lowerLimit,
    upperLimit,
    entryMode: 'direct',
    instrumentKind: 'multimeter',
  };
}

function ripple(part: DemoPart): Measured {
  const isSwitching = part.body.model.topology === 'switch-mode';
  return {
    kind: 'measured',
    ...MEASURED,
    ...UNLIMITED,
    key: 'ripple_pp',
    measurand: 'ripple',
    name: 'Ripple',
    class: 'major',
    condition: loadText(part),
    method: isSwitching
      ? 'AC-coupled, 20 MHz limit, short tip ground, 100 nF and 10 µF at the terminals. Peak to peak over 20 ms.'
      : 'AC-coupled, 10 ms/div, full load for 60 s. Read peak to peak of the tallest wave.',
    caution: isOpenFrame(part) ? OPEN_FRAME_CAUTION : SCOPE_CAUTION,
    unit: isSwitching ? 'mV p-p' : 'V p-p',
    decimals: isSwitching ? 0 : 2,
    upperLimit: part.limits.rippleVolts,
    entryMode: 'scope',
    instrumentKind: 'oscilloscope',
  };
}

function regulation({ limits }: DemoPart): Computed {
  return {
    kind: 'computed',
    ...PLAIN,
    ...UNLIMITED,
    key: 'regulation',
    name: 'Load regulation',
    class: 'minor',
    condition: 'against the loaded voltage',
    method: 'Computed from no-load and loaded voltage.',
    unit: '%',
    decimals: 1,
    upperLimit: limits.regulation,
    formula: { key: 'load-regulation', inputs: { no_load: 'v_no_load', loaded: 'v_loaded' }, constants: {} },
  };
}

function temperatureRise(part: DemoPart): Measured {
  return {
    kind: 'measured',
    ...MEASURED,
    ...UNLIMITED,
    ...FEW_UNITS,
    key: 'temp_rise',
    measurand: 'temperature',
    name: isOpenFrame(part) ? 'Temperature rise' : 'Case temperature rise',
    class: 'major',
    condition: `${loadText(part)}, 60 min`,
    method: 'Thermocouple on the hottest point, free air. Rise above ambient after 60 min.',
    caution: HOT_CAUTION,
    unit: 'K',
    decimals: 1,
    upperLimit: 45,
    entryMode: 'direct',
    instrumentKind: 'thermometer',
  };
}

/** What the plan of a part lists, in the order of the bench. */
export function planCharacteristics(part: DemoPart): Characteristic[] {
  return [
    marking(),
    polarity(part),
    insulation(),
    noLoad(part),
    loaded(part),
    ripple(part),
    regulation(part),
    ...balance(part),
    ...noLoadPower(part),
    ...currentLimit(part),
    temperatureRise(part),
  ];
}

/** Added to a plan in its second revision. */
export const CABLE_LENGTH: Characteristic = {
  kind: 'measured',
  ...MEASURED,
  ownLevel: 'S-4',
  ownAql: '2.5',
  key: 'cable_length',
  measurand: 'dimension',
  name: 'Cable length',
  class: 'minor',
  method: 'Cable straight on the table, from the strain relief to the tip of the plug.',
  unit: 'mm',
  decimals: 0,
  target: 1.8,
  lowerLimit: 1.75,
  upperLimit: 1.85,
  entryMode: 'direct',
  instrumentKind: 'rule',
};
