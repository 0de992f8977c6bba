import { type Request, type RequestHandler } from 'express';
import { type Environment } from '#server/environment';
import { Forbidden } from '#server/problems';

const READING = new Set(['GET', 'HEAD', 'OPTIONS']);

function hostOf(origin: string): string | undefined {
  return URL.canParse(origin) ? new URL(origin).host : undefined;
}

/** A browser says where a request comes from; a program that is no browser says nothing and carries no one's cookies. */
function isOurs(request: Request, publicUrl: string | undefined): boolean {
  const origin = request.get('origin');
  if (origin === undefined) {
    const site = request.get('sec-fetch-site');
    return site === undefined || site === 'same-origin' || site === 'none';
  }
  if (publicUrl !== undefined) return origin === new URL(publicUrl).origin;
  const host = hostOf(origin);
  return host !== undefined && host === request.get('host');
}

/** Refuses requests that change something and come from a page of another site. */
export function originCheck({ publicUrl }: Environment): RequestHandler {
  return (request, _response, next) => {
    if (READING.has(request.method) || isOurs(request, publicUrl)) next();
    else next(new Forbidden('The request comes from another site.', 'cross-site'));
  };
}
