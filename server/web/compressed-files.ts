import { type RequestHandler } from 'express';
import { existsSync, readdirSync } from 'node:fs';

/** Ends the name of a file that was compressed when the application was built; it lies beside the file itself. */
export const COMPRESSED = '.br';

function namesIn(folder: string): ReadonlySet<string> {
  const names = existsSync(folder) ? readdirSync(folder, { recursive: true, encoding: 'utf8' }) : [];
  return new Set(names.map((name) => `/${name.replaceAll('\\', '/')}`));
}

/** Answers with the compressed file where there is one and the browser takes it. */
export function preferCompressed(folder: string): RequestHandler {
  const names = namesIn(folder);
  return (request, response, next) => {
    const compressed = request.path + COMPRESSED;
    if (names.has(compressed)) {
      response.vary('accept-encoding');
      if (request.acceptsEncodings('br') === 'br') request.url = compressed;
    }
    next();
  };
}
