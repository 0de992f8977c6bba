import {
  HttpClient,
  type HttpEvent,
  HttpEventType,
  httpResource,
  type HttpResourceRef,
  type HttpResponse,
} from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { map, mergeMap, type Observable } from 'rxjs';
import type * as z from 'zod';
import { type Endpoint } from '#shared/contract/endpoint';
import { answerOfAnotherShape } from './api-problem';

type NothingNeeded = Record<never, never>;

/** A part of the input may be left out when its schema asks for nothing. */
type Part<K extends string, V> = NothingNeeded extends V
  ? Partial<Record<K, V>>
  : undefined extends V
    ? Partial<Record<K, V>>
    : Record<K, V>;

/** What a call needs: path parameters, query and body as the contract has them, and the version an edit starts from. */
export type CallInput<E extends Endpoint> = Part<'params', z.output<E['params']>> &
  Part<'query', z.input<E['query']>> &
  Part<'body', z.input<E['body']>> & { version?: number };

/** What a call yields. */
export type Reply<E extends Endpoint> = z.output<E['reply']>;

interface LooseInput {
  params?: Record<string, unknown>;
  query?: Record<string, unknown>;
  body?: unknown;
  version?: number;
}

/** The address of an endpoint with its path parameters filled in. */
export function urlOf(path: string, params: Record<string, unknown> = {}): string {
  return path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(String(params[name])));
}

/** The address of an endpoint with its query, for a link to a file or a page that the server makes. */
export function hrefOf<E extends Endpoint>(endpoint: E, input: Omit<CallInput<E>, 'body' | 'version'>): string {
  const { params, query } = input as LooseInput;
  const search = new URLSearchParams(queryOf(query)).toString();
  return urlOf(endpoint.path, params) + (search === '' ? '' : `?${search}`);
}

/** Writes and reads on demand. Every failure is an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class ApiClient {
  private readonly http = inject(HttpClient);

  /** Calls an endpoint; the reply is checked against the contract. */
  call<E extends Endpoint>(endpoint: E, input: CallInput<E>): Observable<Reply<E>> {
    const { params, query, body, version } = input as LooseInput;
    return this.http
      .request(endpoint.method, urlOf(endpoint.path, params), {
        params: queryOf(query),
        body,
        headers: headersOf(endpoint, version),
      })
      .pipe(map((raw) => understood(endpoint, raw)));
  }

  /** Sends a file to an endpoint that takes one, and tells how far it is; the last step holds the reply, checked. */
  upload<E extends Endpoint>(endpoint: E, input: CallInput<E> & { file: Blob }): Observable<UploadStep<Reply<E>>> {
    const { params, query, version } = input as LooseInput;
    return this.http
      .request(endpoint.method, urlOf(endpoint.path, params), {
        params: queryOf(query),
        body: input.file,
        headers: { ...headersOf(endpoint, version), 'content-type': 'application/octet-stream' },
        observe: 'events',
        reportProgress: true,
      })
      .pipe(mergeMap((event) => stepOf(endpoint, event)));
  }

  /** Calls an endpoint that answers with a file. */
  download<E extends Endpoint>(endpoint: E, input: CallInput<E>): Observable<HttpResponse<Blob>> {
    const { params, query, body, version } = input as LooseInput;
    return this.http.request(endpoint.method, urlOf(endpoint.path, params), {
      params: queryOf(query),
      body,
      headers: headersOf(endpoint, version),
      responseType: 'blob',
      observe: 'response',
    });
  }
}

/** How far an upload is: the share sent, from 0 to 1, then the reply. */
export type UploadStep<R> =
  { readonly state: 'sending'; readonly share: number } | { readonly state: 'done'; readonly reply: R };

function stepOf<E extends Endpoint>(endpoint: E, event: HttpEvent<unknown>): UploadStep<Reply<E>>[] {
  if (event.type === HttpEventType.UploadProgress)
    return [{ state: 'sending', share: event.total ? event.loaded / event.total : 0 }];
  if (event.type === HttpEventType.Response) return [{ state: 'done', reply: understood(endpoint, event.body) }];
  return [];
}

/**
 * A page's data: loads when its input is known (`undefined` waits), again when the input changes, and on `reload()`.
 * Reads only.
 */
export function endpointResource<E extends Endpoint>(
  endpoint: E,
  input: () => CallInput<E> | undefined,
): HttpResourceRef<Reply<E> | undefined> {
  return httpResource(
    () => {
      const given = input() as LooseInput | undefined;
      return given && { url: urlOf(endpoint.path, given.params), params: queryOf(given.query) };
    },
    { parse: (raw) => understood(endpoint, raw) },
  );
}

function understood<E extends Endpoint>(endpoint: E, raw: unknown): Reply<E> {
  const read = endpoint.reply.safeParse(raw);
  if (!read.success) throw answerOfAnotherShape();
  return read.data as Reply<E>;
}

function headersOf(endpoint: Endpoint, version: number | undefined): Record<string, string> {
  return endpoint.versioned && version !== undefined ? { 'If-Match': `"${version}"` } : {};
}

/** Query values as text; what is not given is left out. */
function queryOf(query: Record<string, unknown> = {}): Record<string, string> {
  const given = Object.entries(query).filter(([, value]) => value !== undefined && value !== null && value !== '');
  return Object.fromEntries(given.map(([name, value]) => [name, String(value)]));
}
