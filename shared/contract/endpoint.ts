import * as z from 'zod';
import { type Role } from './roles';

export type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

/** Who may call: everybody, everybody who is signed in, a test rack by its token, or holders of one of the named roles. */
export type Who = 'anyone' | 'signed-in' | 'rack' | readonly Role[];

/** Names of the `:params` in a path, read from the literal itself. */
export type PathParams<P extends string> = P extends `${string}:${infer Name}/${infer Rest}`
  ? Name | PathParams<`/${Rest}`>
  : P extends `${string}:${infer Name}`
    ? Name
    : never;

export interface Endpoint<
  M extends Method = Method,
  P extends string = string,
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Reply extends z.ZodType = z.ZodType,
> {
  readonly method: M;
  readonly path: P;
  readonly who: Who;
  readonly summary: string;
  readonly params: Params;
  readonly query: Query;
  readonly body: Body;
  readonly reply: Reply;
  /** HTTP status of success. */
  readonly status: number;
  /** Whether the caller must name the version it edits (If-Match); a lost race is a 412. */
  readonly versioned: boolean;
  /** Media type when the reply is a file rather than JSON. */
  readonly media: string | undefined;
  /** Whether the body may be large (a file's text): up to 25 MB instead of 200 kB. */
  readonly large: boolean;
  /** Where the body is a file's bytes as they are: how many at most. The handler reads them as a stream. */
  readonly upload: number | undefined;
}

const nothing = z.object({});
type Nothing = typeof nothing;

/** The reply of an endpoint that has nothing to say. */
export const done = z.object({ done: z.literal(true) });

/** The reply of an endpoint that answers with a file. */
export const file = z.object({
  bytes: z.custom<Uint8Array>((value) => value instanceof Uint8Array),
  fileName: z.string(),
});

/** The reply of an endpoint that answers with a file from the data folder, sent as a stream. */
export const storedFile = z.object({ filePath: z.string(), fileName: z.string(), mediaType: z.string() });

/** The usual path parameter. */
export const byId = z.object({ id: z.coerce.number().int().positive() });

/** Writes down one endpoint. The contract is the only place where a path is spelled. */
export function endpoint<
  M extends Method,
  P extends string,
  Reply extends z.ZodType,
  Params extends z.ZodType = Nothing,
  Query extends z.ZodType = Nothing,
  Body extends z.ZodType = z.ZodUndefined,
>(
  spec: {
    method: M;
    path: P;
    who: Who;
    summary: string;
    reply: Reply;
    query?: Query;
    body?: Body;
    status?: number;
    versioned?: boolean;
    media?: string;
    large?: boolean;
    upload?: number;
  } & ([PathParams<P>] extends [never]
    ? { params?: undefined }
    : { params: Params & z.ZodType<Record<PathParams<P>, unknown>> }),
): Endpoint<M, P, Params, Query, Body, Reply> {
  return {
    method: spec.method,
    path: spec.path,
    who: spec.who,
    summary: spec.summary,
    params: (spec.params ?? nothing) as unknown as Params,
    query: (spec.query ?? nothing) as unknown as Query,
    body: (spec.body ?? z.undefined()) as unknown as Body,
    reply: spec.reply,
    status: spec.status ?? 200,
    versioned: spec.versioned ?? false,
    media: spec.media,
    large: spec.large ?? false,
    upload: spec.upload,
  };
}
