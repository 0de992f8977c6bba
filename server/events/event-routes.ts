import { readCounts } from '#shared/contract/counts';
import { type Router } from 'express';
import { mayCall } from '#server/caller';
import { type Context } from '#server/context';
import { Forbidden, Problem, Unauthenticated } from '#server/problems';
import { callerFinder } from '#server/sessions/session-queries';

const EVENTS_PATH = '/api/events';

/** The stream of counts, for everybody who may read them. */
export function eventRoutes(router: Router, { db, clock, stream }: Context): void {
  const findCaller = callerFinder(db);
  router.get(EVENTS_PATH, ({ caller }, response) => {
    if (!caller) throw new Unauthenticated();
    if (!mayCall(caller, readCounts)) throw new Forbidden('Your roles do not allow this.');
    if (!stream.hasRoom) throw new Problem(503, 'too-many-listeners', 'Too many pages listen already.');
    stream.listen(response, () => {
      const current = findCaller(caller.sessionId, clock.now());
      return current !== undefined && mayCall(current, readCounts);
    });
  });
}
