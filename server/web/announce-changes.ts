import { type RequestHandler } from 'express';
import { type Stream } from '#server/events/stream';

/** A path of something that belongs to a lot. */
const OF_LOT = /^\/api\/lots\/(\d{1,15})(?:\/|$)/;

/** After every request that changed something the counts may be others, and the lot it named is another. */
export function announceChanges(stream: Stream): RequestHandler {
  return (request, response, next) => {
    if (request.method !== 'GET' && request.method !== 'HEAD') {
      const [, lotId] = OF_LOT.exec(request.baseUrl + request.path) ?? [];
      response.once('finish', () => {
        if (response.statusCode >= 400) return;
        stream.announce();
        if (lotId !== undefined) stream.announceLot(Number(lotId));
      });
    }
    next();
  };
}
