import { type ProblemDetails } from '#shared/contract/problem';
import Sqlite from 'better-sqlite3';
import { type ErrorRequestHandler } from 'express';
import { type Logger } from 'pino';
import * as z from 'zod';
import { Problem } from './problems';

function details(status: number, code: string, title: string, errors: ProblemDetails['errors'] = []): ProblemDetails {
  return { type: `urn:quietrail:problem:${code}`, title, status, code, ...(errors.length > 0 ? { errors } : {}) };
}

function ofZod(error: z.ZodError): ProblemDetails {
  const errors = error.issues.map((issue) => ({
    path: issue.path.map((step) => (typeof step === 'symbol' ? String(step) : step)),
    message: issue.message,
  }));
  return details(400, 'not-the-shape', 'Something in the request is not as it must be.', errors);
}

/** What the database refuses, told in words; anything else it says is our fault. */
function ofSqlite(error: InstanceType<typeof Sqlite.SqliteError>): ProblemDetails | undefined {
  switch (error.code) {
    case 'SQLITE_CONSTRAINT_UNIQUE':
    case 'SQLITE_CONSTRAINT_PRIMARYKEY':
      return details(409, 'exists-already', 'Another record has this number or name already.');
    case 'SQLITE_CONSTRAINT_FOREIGNKEY':
      return details(422, 'refers-to-nothing', 'The request names a record that does not exist.');
    case 'SQLITE_FULL':
      return details(507, 'disk-full', 'The disk of the server is full; nothing was kept.');
    case 'SQLITE_BUSY':
      return details(503, 'busy', 'The database is busy; try again in a moment.');
    default:
      return undefined;
  }
}

/** The disk of the data folder is full. */
function ofDisk(error: unknown): ProblemDetails | undefined {
  if (!(error instanceof Error) || !('code' in error) || error.code !== 'ENOSPC') return undefined;
  return details(507, 'disk-full', 'The disk of the server is full; nothing was kept.');
}

/** Errors of Express and its body parsers carry a status of their own. */
function ofHttp(error: unknown): ProblemDetails | undefined {
  if (!(error instanceof Error) || !('status' in error) || typeof error.status !== 'number') return undefined;
  if (error.status === 413) return details(413, 'too-large', 'The request is larger than allowed.');
  if (error.status >= 400 && error.status < 500)
    return details(error.status, 'not-understood', 'The request could not be read.');
  return undefined;
}

/** What the caller is told about an error; undefined when the error is ours. */
export function problemOf(error: unknown): ProblemDetails | undefined {
  if (error instanceof Problem) return details(error.status, error.code, error.title, [...error.errors]);
  if (error instanceof z.ZodError) return ofZod(error);
  if (error instanceof Sqlite.SqliteError) return ofSqlite(error);
  const cause = error instanceof Error ? error.cause : undefined;
  // Drizzle wraps what the driver threw.
  if (cause instanceof Sqlite.SqliteError) return ofSqlite(cause);
  return ofDisk(error) ?? ofHttp(error);
}

/** The one place where errors become answers. */
export function problemHandler(log: Logger): ErrorRequestHandler {
  // Express tells an error handler by its four parameters.
  return (error, request, response, next) => {
    if (response.headersSent) {
      next(error);
      return;
    }
    const told = problemOf(error);
    if (!told) log.error({ err: error as unknown, url: request.originalUrl }, 'request failed');
    const answer = told ?? details(500, 'our-fault', 'The server failed; the failure is in its log.');
    response.status(answer.status).type('application/problem+json').send(JSON.stringify(answer));
  };
}
