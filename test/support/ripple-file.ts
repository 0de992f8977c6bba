import { readFileSync } from 'node:fs';
import path from 'node:path';

const FOLDER = path.join(import.meta.dirname, '..', 'reference', 'data', 'ripple');

/** A captured waveform of the reference data, as its file is: "o4_ct_unbal_50hz". */
export function rippleFile(id: string): Buffer {
  return readFileSync(path.join(FOLDER, `${id}.csv`));
}
