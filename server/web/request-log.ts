import { type RequestHandler } from 'express';
import { type IncomingMessage, type ServerResponse } from 'node:http';
import { type Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** One line per request: what was asked and what came of it. Headers stay out of the log, they carry the session. */
export function requestLog(log: Logger): RequestHandler {
  return pinoHttp<IncomingMessage, ServerResponse>({
    logger: log,
    customLogLevel: (_request, response, error) => (error || response.statusCode >= 500 ? 'error' : 'debug'),
    serializers: {
      req: ({ id, method, url }: { id: unknown; method: string; url: string }) => ({ id, method, url }),
      res: ({ statusCode }: { statusCode: number }) => ({ statusCode }),
    },
  });
}
