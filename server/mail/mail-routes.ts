import { type Context } from '#server/context';
import { serve } from '#server/serve';
import { listMessages, listReceived, readMessage, readReceived } from '#shared/contract/mail';
import { type Router } from 'express';
import { findMessage, findReceived, messagePage, receivedPage } from './message-queries';

export function mailRoutes(router: Router, { db, environment }: Context): void {
  const fake = environment.smtpUrl === undefined;

  serve(router, listMessages, ({ query }) => messagePage(db, query));
  serve(router, readMessage, ({ params }) => findMessage(db, params.id));
  // A database that once ran with the local server keeps what that received; with a real one it is not shown.
  serve(router, listReceived, ({ query }) => ({
    ...(fake ? receivedPage(db, query) : { items: [], next: null }),
    fake,
  }));
  serve(router, readReceived, ({ params }) => findReceived(db, params.id));
}
