import { type ElectricalModel } from '#shared/contract/parts';
import { expectedBands } from '#shared/measurement/rectifier/expected-bands';
import { expectedOutput } from './expected-output';

const MODEL: ElectricalModel = {
  topology: 'bridge',
  lineVolts: 230,
  lineHertz: 50,
  ratedVolts: 12,
  ratedAmperes: 0.5,
  secondaryPeakVolts: 18.2,
  sourceOhms: 2.6,
  diodeDropVolts: 0.85,
  filterFarads: 0.0022,
  filterTolerance: 0.2,
  filterEsrOhms: null,
};

function known(model: ElectricalModel = MODEL) {
  const output = expectedOutput(model, expectedBands(model));
  if (output.kind === 'unknown') throw new Error(output.why);
  return output;
}

describe('expectedOutput', () => {
  it('sets the textbook beside the model, with how far it is off and why', () => {
    const { rows, reason } = known();
    const [ripple] = rows;
    // I/(f_r C) = 0.5 A / (100 Hz · 2 200 µF); Malvino, Electronic Principles, ch. 4.
    expect(ripple?.textbook).toBe('2.27\u00a0V');
    expect(ripple?.off).toMatch(/^\+\d/);
    expect(reason).toMatch(/^Too high/);
    expect(ripple?.band).toMatch(/^[\d.]+ to [\d.]+\u00a0V$/);
  });

  it('draws one line cycle, with ripple at twice its frequency', () => {
    const { wave, rippleHertz } = known();
    expect(wave.length).toBeGreaterThan(100);
    expect(rippleHertz).toBe('100\u00a0Hz');
    expect(known({ ...MODEL, topology: 'half-wave' }).rippleHertz).toBe('50\u00a0Hz');
  });

  it('says what is missing for a model', () => {
    expect(expectedOutput({ ...MODEL, sourceOhms: null, secondaryPeakVolts: null }, null)).toEqual({
      kind: 'unknown',
      why: 'No model yet: give the secondary peak without load and the source resistance.',
    });
  });

  it('makes none of a switch-mode supply', () => {
    const output = expectedOutput({ ...MODEL, topology: 'switch-mode' }, null);
    expect(output).toMatchObject({ kind: 'unknown', why: expect.stringContaining('does not follow') as string });
  });
});
