import type { Endpoint } from '#shared/contract/endpoint';
import { type Request, type Response, type Router } from 'express';
import type * as z from 'zod';
import { type Caller, hasRole } from './caller';
import { Forbidden, Problem, Unauthenticated } from './problems';
import { type RackCaller } from './racks/rack-caller';

/** What a handler gets: parsed input, the version named by If-Match, and who calls. */
export interface Input<E extends Endpoint> {
  params: z.output<E['params']>;
  query: z.output<E['query']>;
  body: z.output<E['body']>;
  version: number;
  caller: Caller;
  /** The rack that calls, where the endpoint is one for racks. */
  rack: RackCaller;
  request: Request;
  response: Response;
}
type Reply<E extends Endpoint> = z.input<E['reply']>;
export type Handler<E extends Endpoint> = (input: Input<E>) => Reply<E> | Promise<Reply<E>>;

declare module 'express-serve-static-core' {
  // Express declares its request as an interface to be extended.
  interface Request {
    caller?: Caller;
    rack?: RackCaller;
  }
}

/** What a rack does no person does, whatever their roles. */
function authoriseRack({ rack, caller }: Request): void {
  if (rack) return;
  throw caller ? new Forbidden('Only a test rack calls this, by its token.') : new Unauthenticated();
}

function authorise(endpoint: Endpoint, request: Request): Caller | undefined {
  const caller = request.caller;
  if (endpoint.who === 'anyone') return caller;
  if (endpoint.who === 'rack') {
    authoriseRack(request);
    return caller;
  }
  if (request.rack) throw new Forbidden('A test rack may not do this; its token works under /api/rack.');
  if (!caller) throw new Unauthenticated();
  if (endpoint.who !== 'signed-in' && !hasRole(caller, ...endpoint.who))
    throw new Forbidden('Your roles do not allow this.');
  return caller;
}

function namedVersion(endpoint: Endpoint, request: Request): number {
  if (!endpoint.versioned) return 0;
  const given = request.get('if-match');
  if (given === undefined)
    throw new Problem(428, 'version-missing', 'The request must name the version it changes (If-Match).');
  const version = Number(given.replaceAll('"', ''));
  if (!Number.isInteger(version) || version < 1)
    throw new Problem(400, 'version-not-understood', 'If-Match must hold a version number.');
  return version;
}

/** A reply that has not its shape is a fault of the program; it must not pass for one of the request. */
function checked(endpoint: Endpoint, reply: unknown): unknown {
  const read = endpoint.reply.safeParse(reply);
  if (read.success) return read.data;
  throw new Error(`The reply of ${endpoint.method} ${endpoint.path} is not as the contract says.`, {
    cause: read.error,
  });
}

/** A file's bytes, or where it lies. */
type SentFile = { bytes: Uint8Array; fileName: string } | { filePath: string; fileName: string; mediaType: string };

/** What the program made is shown; what somebody uploaded is only ever saved, and never taken for a page. */
function sendFile(media: string, response: Response, file: SentFile): void {
  const fileName = file.fileName.replaceAll(/[^\w.-]/g, '_');
  if ('bytes' in file) {
    response.set('content-disposition', `inline; filename="${fileName}"`);
    response.type(media).send(Buffer.from(file.bytes));
    return;
  }
  response.attachment(fileName).type(file.mediaType);
  response.sendFile(file.filePath, { cacheControl: false, dotfiles: 'allow' });
}

function send(endpoint: Endpoint, response: Response, reply: unknown): void {
  const parsed = checked(endpoint, reply);
  response.status(endpoint.status);
  if (endpoint.media !== undefined) {
    sendFile(endpoint.media, response, parsed as SentFile);
    return;
  }
  if (typeof parsed === 'object' && parsed !== null && 'version' in parsed)
    response.set('etag', `"${String(parsed.version)}"`);
  response.json(parsed);
}

/** Binds one endpoint of the contract: authorises, validates, calls the handler, checks and sends its reply. */
export function serve<E extends Endpoint>(router: Router, endpoint: E, handle: Handler<E>): void {
  const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
  router[method](endpoint.path, async (request: Request, response: Response) => {
    const caller = authorise(endpoint, request);
    const version = namedVersion(endpoint, request);
    const reply = await handle({
      params: endpoint.params.parse(request.params) as z.output<E['params']>,
      query: endpoint.query.parse(request.query) as z.output<E['query']>,
      body: endpoint.body.parse(request.body) as z.output<E['body']>,
      version,
      // Endpoints for anyone do not look at the caller; all others have one here.
      caller: caller as Caller,
      rack: request.rack as RackCaller,
      request,
      response,
    });
    send(endpoint, response, reply);
  });
}
