import express, { type Request, type RequestHandler, type Response } from 'express';
import path from 'node:path';
import { COMPRESSED, preferCompressed } from './compressed-files';

/** Files with a hash in their name never change. */
const HASHED = /-[\w-]{8}\.\w+$/;

/** Scripts, styles and fonts open no page, so that what only a page heeds would be sent in vain with each of them. */
const PAGELESS = /\.(js|css|woff2)$/;
const FOR_PAGES = [
  'content-security-policy',
  'referrer-policy',
  'x-dns-prefetch-control',
  'x-download-options',
  'x-frame-options',
  'x-permitted-cross-domain-policies',
  'x-xss-protection',
];

function setHeaders(response: Response, served: string): void {
  const compressed = served.endsWith(COMPRESSED);
  const file = compressed ? served.slice(0, -COMPRESSED.length) : served;
  if (compressed) response.type(path.extname(file)).set('content-encoding', 'br');
  if (HASHED.test(file) && PAGELESS.test(file)) for (const header of FOR_PAGES) response.removeHeader(header);
  const caching = HASHED.test(file) ? 'public, max-age=31536000, immutable' : 'no-cache';
  response.set('cache-control', path.basename(file) === 'index.html' ? 'no-store' : caching);
}

/** Whether the address is a page of the application rather than a file. */
function asksForPage(request: Request): boolean {
  return request.method === 'GET' && path.extname(request.path) === '' && request.accepts('html') === 'html';
}

/** The application was not built. */
function isMissing(error: Error): boolean {
  return 'code' in error && error.code === 'ENOENT';
}

/** The browser's application: its files, and its one page under every address of its own. */
export function staticApp(root: string): RequestHandler[] {
  const folder = path.join(root, 'dist', 'app');
  const files = express.static(folder, { index: false, redirect: false, setHeaders, cacheControl: false });
  const page: RequestHandler = (request, response, next) => {
    if (!asksForPage(request)) {
      next();
      return;
    }
    const headers = { 'cache-control': 'no-store' };
    response.sendFile('index.html', { root: folder, cacheControl: false, headers }, (error) => {
      if (error) next(isMissing(error) ? undefined : error);
    });
  };
  return [preferCompressed(folder), files, page];
}
