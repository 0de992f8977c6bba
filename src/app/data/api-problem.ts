import { HttpErrorResponse } from '@angular/common/http';
import { problem, type Fault, type ProblemDetails } from '#shared/contract/problem';

/** Code of a problem that the browser, not the server, states: the server could not be reached. */
export const OFFLINE = 'offline';

/** Code of an answer that has not the shape the contract promises. */
const NOT_UNDERSTOOD = 'answer-not-understood';

/**
 * Why a call failed, in the server's own sentence. `status` is 0 when the server could not be reached; `faults` name the
 * fields that were refused; `at` is when the answer came.
 */
export class ApiProblem extends Error {
  readonly status: number;
  readonly code: string;
  readonly title: string;
  readonly detail: string | undefined;
  readonly faults: readonly Fault[];

  constructor(
    details: Omit<ProblemDetails, 'type'>,
    readonly at: Date,
  ) {
    super(details.detail ?? details.title);
    this.name = 'ApiProblem';
    this.status = details.status;
    this.code = details.code;
    this.title = details.title;
    this.detail = details.detail;
    this.faults = details.errors ?? [];
  }

  /** Whether the server could not be reached at all. */
  get offline(): boolean {
    return this.status === 0;
  }
}

/** An answer of another shape than this page knows, as after the program was renewed while the page stood open. */
export function answerOfAnotherShape(at = new Date()): ApiProblem {
  const title = 'The answer is not what this page expects; the program may have been renewed. Load the page again.';
  return new ApiProblem({ title, status: 200, code: NOT_UNDERSTOOD }, at);
}

/** Whatever was thrown, as a problem a page can show. */
export function problemOf(thrown: unknown, at = new Date()): ApiProblem {
  if (thrown instanceof ApiProblem) return thrown;
  if (thrown instanceof HttpErrorResponse) return problemOfAnswer(thrown, at);
  const detail = thrown instanceof Error ? thrown.message : String(thrown);
  return new ApiProblem({ title: 'The answer was not understood.', status: 500, code: NOT_UNDERSTOOD, detail }, at);
}

function problemOfAnswer(answer: HttpErrorResponse, at: Date): ApiProblem {
  if (answer.status === 0) {
    return new ApiProblem({ title: 'The server could not be reached.', status: 0, code: OFFLINE }, at);
  }
  const stated = problem.safeParse(bodyOf(answer.error));
  if (stated.success) return new ApiProblem(stated.data, at);
  const title = answer.status < 400 ? 'The answer was not understood.' : `The server answered ${answer.status}.`;
  return new ApiProblem({ title, status: answer.status, code: NOT_UNDERSTOOD }, at);
}

/** A problem that came where a file was asked for arrives as text. */
function bodyOf(error: unknown): unknown {
  if (typeof error !== 'string') return error;
  try {
    return JSON.parse(error);
  } catch {
    return undefined;
  }
}
