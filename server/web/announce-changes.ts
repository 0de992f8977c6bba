import { type RequestHandler } from 'express';
import { type Stream } from '#server/events/stream';

/** After every request that changed something the counts may be others. */
export function announceChanges(stream: Stream): RequestHandler {
  return (request, response, next) => {
    if (request.method !== 'GET' && request.method !== 'HEAD')
      response.once('finish', () => {
        if (response.statusCode < 400) stream.announce();
      });
    next();
  };
}
