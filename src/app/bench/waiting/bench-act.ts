import { readingBody, type ReadingBody } from '#shared/contract/bench';

interface OnUnit {
  /** Made at the bench; sending an act twice changes nothing. */
  readonly id: string;
  readonly lotId: number;
  readonly unit: number;
}

/** Something done at the bench that the server is to record. */
export type BenchAct =
  | (OnUnit & { readonly kind: 'reading'; readonly body: ReadingBody })
  | (OnUnit & { readonly kind: 'withdrawal'; readonly readingId: string })
  | (OnUnit & { readonly kind: 'set-aside'; readonly reason: string | null });

/** An act on its way to the server. */
export interface WaitingAct {
  readonly act: BenchAct;
  /** Who did it; only that person's session sends it. */
  readonly personId: number;
  /** Acts are sent in the order they were done. */
  readonly order: number;
  /** The server's sentence when it refused the act; null while it waits. */
  readonly refusal: string | null;
}

/** What was written down by an earlier page, if it still reads as a waiting act. */
export function waitingActOf(stored: unknown): WaitingAct | null {
  if (!isRecord(stored) || !isRecord(stored['act'])) return null;
  const { act, personId, order, refusal } = stored;
  const whole = typeof personId === 'number' && typeof order === 'number' && isText(refusal);
  return whole && isAct(act) ? { act, personId, order, refusal } : null;
}

function isAct(act: unknown): act is BenchAct {
  if (!isRecord(act) || typeof act['id'] !== 'string') return false;
  if (typeof act['lotId'] !== 'number' || typeof act['unit'] !== 'number') return false;
  if (act['kind'] === 'reading') return readingBody.safeParse(act['body']).success;
  if (act['kind'] === 'withdrawal') return typeof act['readingId'] === 'string';
  return act['kind'] === 'set-aside' && isText(act['reason']);
}

function isText(value: unknown): value is string | null {
  return value === null || typeof value === 'string';
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}
