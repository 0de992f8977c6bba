import { typedReading } from '../support/bench-acts';
import { randomUUID } from 'node:crypto';
import { TWELVE } from './bench-plan';
import { type ReadingFile } from './reading-file';

export interface ReadingRequest {
  path: string;
  cookie: string;
  body: string;
}

/** Gives each client its next reading. */
export type NextReading = (client: number) => ReadingRequest;

const TYPED = TWELVE.filter(({ kind }) => kind !== 'computed');
const NOW = new Date().toISOString();

interface Cell {
  lotId: number;
  /** From 0. */
  unit: number;
  column: number;
  attempt: number;
}

/** Every client goes through its own lot, unit by unit; then through all of it again. */
function cellWalk({ lots }: ReadingFile): (client: number) => Cell {
  const steps = lots.map(() => 0);
  return (client) => {
    const lot = lots[client];
    const step = steps[client];
    if (lot === undefined || step === undefined) throw new Error(`There is no lot for client ${client}.`);
    steps[client] = step + 1;
    const row = Math.floor(step / TYPED.length);
    const [unit, attempt] = [row % lot.sampleSize, 1 + Math.floor(row / lot.sampleSize)];
    return { lotId: lot.id, unit, column: step % TYPED.length, attempt };
  };
}

function valueOf(step: number): string {
  return (12 + (step % 97) / 1000).toFixed(3);
}

/** What the bench sends to the program. */
export function programRequests(file: ReadingFile): NextReading {
  const next = cellWalk(file);
  return (client) => {
    const { lotId, unit, column, attempt } = next(client);
    if (attempt > 1) throw new Error('The lots are measured through: there are too few of them.');
    const { key, kind } = TYPED[column] ?? { key: '', kind: 'measured' };
    const judged = kind === 'attribute';
    const more = judged ? { entry: { kind, pass: true, reason: '' } } : { instrumentId: file.planned.instrumentId };
    const body = JSON.stringify(typedReading(unit + 1, key, valueOf(unit), { ...more, takenAt: NOW }));
    return { path: `/api/lots/${lotId}/readings/${randomUUID()}`, cookie: `qr_access=${file.access}`, body };
  };
}

/** The row that the program writes, ready to be written. */
export function rowRequests(file: ReadingFile): NextReading {
  const next = cellWalk(file);
  const { instrumentId, characteristicIds } = file.planned;
  return (client) => {
    const { lotId, unit, column, attempt } = next(client);
    const { key, kind } = TYPED[column] ?? { key: '', kind: 'measured' };
    const judged = kind === 'attribute';
    const text = valueOf(unit);
    const row = {
      lotId,
      unitId: file.unitIds.get(lotId)?.[unit],
      characteristicId: characteristicIds.get(key),
      attempt,
      value: judged ? null : Number(text),
      pass: judged ? 1 : null,
      entry: JSON.stringify(judged ? { kind, pass: true, reason: '' } : { kind: 'direct', text, decimalComma: false }),
      instrumentId: judged ? null : instrumentId,
      takenById: file.personId,
      takenAt: NOW,
    };
    return { path: `/readings/${randomUUID()}`, cookie: '', body: JSON.stringify(row) };
  };
}
