import { type Fault } from '#shared/contract/problem';
import { type Characteristic } from '#shared/contract/plans';
import { planFaults } from '#shared/plan/plan-faults';
import { type Aql } from '#shared/sampling/scheme';
import { describe, expect, it } from 'vitest';
import { attribute, computed, measured, revisionBody } from '../support/plan-bodies';

function faultsOf(...characteristics: Characteristic[]): string[] {
  return planFaults(revisionBody({ characteristics })).map(words);
}
function words({ path, message }: Fault): string {
  return `${path.join('.')}: ${message}`;
}
const REGULATION = { key: 'load-regulation', inputs: { no_load: 'v0', loaded: 'v1' } } as const;

describe('a plan', () => {
  it('that can be used has no fault', () => {
    expect(planFaults(revisionBody())).toEqual([]);
  });

  it('may list a characteristic without limits: it is recorded and fails no unit', () => {
    expect(faultsOf(measured('v0'))).toEqual([]);
  });

  it('names each characteristic by a key of its own', () => {
    expect(faultsOf(measured('v0'), measured('v0', { name: 'Another' }))).toEqual([
      'characteristics.1.key: Another characteristic has this key.',
    ]);
    const twin = { name: 'Output voltage', condition: 'at 0.2 A' };
    expect(faultsOf(measured('v0', twin), measured('v1', twin))).toEqual([
      'characteristics.1.name: Another characteristic has this name and condition.',
    ]);
    expect(faultsOf(measured('v0', twin), measured('v1', { ...twin, condition: 'no load' }))).toEqual([]);
  });

  it('leaves an acceptance zone between two limits', () => {
    expect(faultsOf(measured('v0', { lowerLimit: 5, upperLimit: 5 }))).toEqual([
      'characteristics.0.upperLimit: The upper limit must be above the lower one.',
    ]);
  });

  it('has its target within the limits, which belong to the zone', () => {
    expect(faultsOf(measured('v0', { lowerLimit: 4, upperLimit: 5, target: 3.9 }))).toEqual([
      'characteristics.0.target: The target is below the lower limit.',
    ]);
    expect(faultsOf(measured('v0', { upperLimit: 5, target: 5.1 }))).toEqual([
      'characteristics.0.target: The target is above the upper limit.',
    ]);
    expect(faultsOf(measured('v0', { lowerLimit: 4, upperLimit: 5, target: 5 }))).toEqual([]);
  });

  it('gives every class in use an AQL, unless each of its characteristics has its own', () => {
    const plan = (ownAql: Aql | null) =>
      revisionBody({
        classAqls: [{ class: 'minor', aql: '1.0' }],
        characteristics: [measured('v0', { class: 'critical', ownAql })],
      });
    expect(planFaults(plan(null)).map(words)).toEqual(['classAqls: Class critical is used and has no AQL.']);
    expect(planFaults(plan('0.10'))).toEqual([]);
  });

  it('gives a class one AQL', () => {
    const classAqls = [
      { class: 'major', aql: '1.0' },
      { class: 'major', aql: '2.5' },
    ] as const;
    expect(
      planFaults(revisionBody({ classAqls: [...classAqls], characteristics: [measured('v0')] })).map(words),
    ).toEqual(['classAqls.1.class: This class has an AQL already.']);
  });

  it('takes AQLs up to 10, the highest that is a percentage of nonconforming units', () => {
    const plan = (aql: Aql, ownAql: Aql) =>
      revisionBody({ classAqls: [{ class: 'major', aql }], characteristics: [measured('v0', { ownAql })] });
    expect(planFaults(plan('10', '10'))).toEqual([]);
    expect(planFaults(plan('15', '1000')).map(({ path }) => path)).toEqual([
      ['classAqls', 0, 'aql'],
      ['characteristics', 0, 'ownAql'],
    ]);
  });

  it('reads a scope in volts', () => {
    expect(faultsOf(measured('r', { entryMode: 'scope', unit: 'mV p-p' }))).toEqual([]);
    expect(faultsOf(measured('i', { entryMode: 'scope', unit: 'mA' }))).toEqual([
      'characteristics.0.entryMode: A scope reads volts. Choose a unit of volts, or typed entry.',
    ]);
  });

  it('judges by eye against a requirement', () => {
    expect(faultsOf(attribute('label', { class: 'minor', requirement: ' ' }))).toEqual([
      'characteristics.0.requirement: Say what a unit must be to pass.',
    ]);
  });
});

describe('a computed characteristic', () => {
  it('takes every input from a measured one, wherever it stands in the plan', () => {
    expect(faultsOf(computed('reg', REGULATION), measured('v0'), measured('v1'))).toEqual([]);
  });

  it('names what exists, all of it and nothing more', () => {
    const inputs = { no_load: 'gone', spare: 'v1' };
    expect(faultsOf(measured('v1'), computed('reg', { key: 'load-regulation', inputs }))).toEqual([
      'characteristics.1.formula.inputs.no_load: This plan has no characteristic gone.',
      'characteristics.1.formula.inputs.loaded: Choose the characteristic that this is taken from.',
      'characteristics.1.formula.inputs.spare: This formula has no such input.',
    ]);
  });

  it('never feeds a computed one, nor does one judged by eye', () => {
    const first = computed('reg', REGULATION);
    const second = computed('twice', { key: 'load-regulation', inputs: { no_load: 'reg', loaded: 'label' } });
    const label = attribute('label', { class: 'minor' });
    expect(faultsOf(measured('v0'), measured('v1'), first, second, label)).toEqual([
      'characteristics.3.formula.inputs.no_load: Only a measured characteristic can be taken here.',
      'characteristics.3.formula.inputs.loaded: Only a measured characteristic can be taken here.',
    ]);
  });

  it('takes two different ones: a winding balances with itself always', () => {
    const inputs = { half1: 'v0', half2: 'v0' };
    expect(faultsOf(measured('v0'), computed('bal', { key: 'transformer-balance', inputs }))).toEqual([
      'characteristics.1.formula.inputs.half2: This characteristic is taken for another input already.',
    ]);
  });

  it('is shown in the kind of unit its formula yields', () => {
    expect(faultsOf(measured('v0'), measured('v1'), computed('reg', REGULATION, { unit: 'V' }))).toEqual([
      'characteristics.2.unit: This formula yields %.',
    ]);
  });
});

describe('a rating that a formula takes', () => {
  const readings = [measured('v0'), measured('v1')];
  const line = (constants: Record<string, number>) =>
    faultsOf(
      ...readings,
      computed('line', { key: 'line-regulation', inputs: { high_line: 'v0', low_line: 'v1' }, constants }),
    );

  it('is given, above 0, and one the formula has', () => {
    expect(line({ rated: 12 })).toEqual([]);
    expect(line({})).toEqual(['characteristics.2.formula.constants.rated: Give this rating.']);
    expect(line({ rated: 0 })).toEqual(['characteristics.2.formula.constants.rated: A rating is more than 0.']);
    expect(line({ rated: 12, load: 1 })).toEqual([
      'characteristics.2.formula.constants.load: This formula has no such rating.',
    ]);
  });
});

describe('what is measured', () => {
  it('is in a unit of its own kind', () => {
    expect(faultsOf(measured('hot', { measurand: 'temperature', unit: '°C' }))).toEqual([]);
    expect(faultsOf(measured('ripple', { measurand: 'ripple', unit: 'mV p-p' }))).toEqual([]);
    expect(faultsOf(measured('ripple', { measurand: 'ripple', unit: 'A' }))).toEqual([
      'characteristics.0.measurand: Ripple, peak to peak is not measured in A.',
    ]);
  });
});
