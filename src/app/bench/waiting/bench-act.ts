import { CONFIRM_REASONS, readingBody, type ReadingBody } from '#shared/contract/bench';

interface OnUnit {
  /** Made at the bench; sending an act twice changes nothing. */
  readonly id: string;
  readonly lotId: number;
  readonly unit: number;
}

/** Why a reading is kept that is far from what the part can give. */
export interface Confirmation {
  readonly reason: (typeof CONFIRM_REASONS)[number];
  readonly note: string;
}

/** Something done at the bench that the server is to record. */
export type BenchAct =
  /** `measured`: what a captured file gave, in SI base units; a typed entry says it itself. */
  | (OnUnit & { readonly kind: 'reading'; readonly body: ReadingBody; readonly measured?: number | null })
  | (OnUnit & { readonly kind: 'withdrawal'; readonly readingId: string })
  | (OnUnit & { readonly kind: 'answer'; readonly readingId: string; readonly answer: Confirmation })
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
  /** The code that goes with a refusal. */
  readonly code?: string;
}

/** What was written down by an earlier page, if it still reads as a waiting act. */
export function waitingActOf(stored: unknown): WaitingAct | null {
  if (!isRecord(stored) || !isRecord(stored['act'])) return null;
  const { act, personId, order, refusal, code } = stored;
  const whole = typeof personId === 'number' && typeof order === 'number' && isText(refusal);
  if (!whole || !isAct(act)) return null;
  return { act, personId, order, refusal, code: typeof code === 'string' ? code : '' };
}

function isAct(act: unknown): act is BenchAct {
  if (!isRecord(act) || typeof act['id'] !== 'string') return false;
  if (typeof act['lotId'] !== 'number' || typeof act['unit'] !== 'number') return false;
  if (act['kind'] === 'reading') return isReading(act);
  if (act['kind'] === 'withdrawal') return typeof act['readingId'] === 'string';
  if (act['kind'] === 'answer') return typeof act['readingId'] === 'string' && isConfirmation(act['answer']);
  return act['kind'] === 'set-aside' && isText(act['reason']);
}

/** A page of an earlier program knew neither ranges nor questions; the act is completed as it would send it. */
function isReading(act: Record<string, unknown>): boolean {
  const read = readingBody.safeParse(act['body']);
  if (read.success) act['body'] = read.data;
  return read.success;
}

function isConfirmation(answer: unknown): boolean {
  if (!isRecord(answer)) return false;
  return CONFIRM_REASONS.some((reason) => reason === answer['reason']) && typeof answer['note'] === 'string';
}

function isText(value: unknown): value is string | null {
  return value === null || typeof value === 'string';
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}
