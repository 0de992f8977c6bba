import { circuitOf } from '#shared/measurement/rectifier/expected-bands';
import { simulateRectifier } from '#shared/measurement/rectifier/simulate-rectifier';
import { type Chance } from './chance';
import { type DemoPart } from './demo-part';
import { type Fault } from './production';

const LINE_CYCLES = 5;
/** Noise of the oscilloscope as a share of the ripple. */
const NOISE = 0.004;
/** How far a bad tap is off, as a share of the mean of the halves. */
const BAD_TAP = 0.045;

/**
 * What an oscilloscope captures of a unit under load, as its file: the part's own rectifier, at the ripple that the unit
 * has.
 *
 * @returns undefined for a part that is no rectifier
 */
export function demoWave(part: DemoPart, fault: Fault, rippleVolts: number, chance: Chance): string | undefined {
  const circuit = circuitOf(part.body.model);
  if (!circuit) return undefined;
  const [peak] = circuit.sourcePeakVolts;
  const halves: readonly [number, number] = [peak * (1 + BAD_TAP / 2), peak * (1 - BAD_TAP / 2)];
  const sourcePeakVolts = fault === 'bad-tap' ? halves : circuit.sourcePeakVolts;
  const { wave, meanVolts, rippleVolts: modelled } = simulateRectifier({ ...circuit, sourcePeakVolts });
  const step = 1 / circuit.lineHertz / wave.length;
  const samples = Math.round(wave.length * (LINE_CYCLES + chance.between(0.1, 0.4)));
  const rows = Array.from({ length: samples }, (_, at) => {
    const volts = (wave[at % wave.length] ?? meanVolts) - meanVolts;
    const seen = meanVolts + (volts * rippleVolts) / modelled + chance.about(0, NOISE * rippleVolts);
    return `${(at * step).toFixed(7)},${seen.toFixed(4)}`;
  });
  return ['Time (s),CH1 (V)', ...rows].join('\n');
}
