import { type WaveformFinding } from '#shared/contract/waveforms';
import { type VerdictLook } from '../ui/verdict-look';

type Kind = WaveformFinding['kind'];

/** What a finding is called, and how it looks: it is advice, and turns no verdict. */
export const FINDINGS: Readonly<Record<Kind, { title: string; look: VerdictLook }>> = {
  clipped: { title: 'Cut off', look: 'hold' },
  aliased: { title: 'Sampled too slowly', look: 'hold' },
  'too-coarse': { title: 'Too few levels', look: 'hold' },
  'too-short': { title: 'Too short', look: 'hold' },
  'one-half-open': { title: 'One half does not conduct', look: 'nok' },
  'unequal-halves': { title: 'Unequal halves', look: 'nok' },
  'unequal-paths': { title: 'Unequal paths', look: 'nok' },
  'capacitance-low-or-load-high': { title: 'Capacitance low or load high', look: 'nok' },
  'load-missing': { title: 'Load missing', look: 'nok' },
  'nothing-unusual': { title: 'Nothing unusual', look: 'ok' },
};
