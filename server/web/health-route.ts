import { sql } from 'drizzle-orm';
import { type RequestHandler } from 'express';
import { type Context } from '#server/context';

/** Whether the program answers and its database does. */
export function healthRoute({ db }: Context): RequestHandler {
  return (_request, response) => {
    db.get(sql`select 1`);
    response.set('cache-control', 'no-store').json({ healthy: true });
  };
}
