import * as z from 'zod';
import { endpoint } from './endpoint';

export const readDescription = endpoint({
  method: 'GET',
  path: '/api/openapi.json',
  who: 'anyone',
  summary: 'This interface as an OpenAPI 3.1 document.',
  reply: z.record(z.string(), z.unknown()),
});
export const readDocumentation = endpoint({
  method: 'GET',
  path: '/api/docs',
  who: 'anyone',
  summary: 'This interface as a page to read.',
  media: 'text/html; charset=utf-8',
  reply: z.object({ bytes: z.custom<Uint8Array>((value) => value instanceof Uint8Array), fileName: z.string() }),
});
