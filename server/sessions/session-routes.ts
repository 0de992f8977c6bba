import * as contract from '#shared/contract/session';
import { type Response, type Router } from 'express';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { Unauthenticated } from '#server/problems';
import { serve } from '#server/serve';
import { accountAndAddress, attemptLimit, callersAccount } from './attempt-limit';
import { changePassword } from './change-password';
import { findLink } from './one-time-links';
import { openSite } from './open-site';
import { refreshSession } from './refresh-session';
import { clearCookies, giveCookies, refreshTokenOf } from './session-cookies';
import { callerFinder } from './session-queries';
import { setPassword } from './set-password';
import { signIn } from './sign-in';
import { signOut } from './sign-out';
import { type SessionTokens } from './start-session';

const DONE = { done: true } as const;

function me({ id, name, email, stampNumber, roles }: Caller): contract.Me {
  return { id, name, email, stampNumber, roles: [...roles] };
}

export function sessionRoutes(router: Router, context: Context): void {
  const findCaller = callerFinder(context.db);
  const welcome = (response: Response, tokens: SessionTokens): contract.Me => {
    giveCookies(context, response, tokens);
    const caller = findCaller(tokens.sessionId, context.clock.now());
    if (!caller) throw new Unauthenticated('session-ended', 'Your session has ended. Sign in again.');
    return me(caller);
  };

  router.post(contract.signIn.path, attemptLimit(context, accountAndAddress));
  router.put(contract.changePassword.path, attemptLimit(context, callersAccount));

  serve(router, contract.signIn, async ({ body, response }) => welcome(response, await signIn(context, body)));
  serve(router, contract.readMe, ({ caller }) => me(caller));
  serve(router, contract.refreshSession, ({ request, response }) => {
    try {
      return welcome(response, refreshSession(context, refreshTokenOf(request)));
    } catch (error) {
      clearCookies(context, response);
      throw error;
    }
  });
  serve(router, contract.signOut, ({ request, response }) => {
    signOut(context, refreshTokenOf(request), request.caller?.sessionId);
    clearCookies(context, response);
    return DONE;
  });
  serve(router, contract.changePassword, async ({ caller, body }) => {
    await changePassword(context, caller, body);
    return DONE;
  });
  serve(router, contract.readOneTimeLink, ({ body }) => {
    const { purpose, person } = findLink(context.db, body.token, context.clock.now());
    return { purpose, name: person?.name ?? null, email: person?.email ?? null };
  });
  serve(router, contract.openSite, async ({ body }) => {
    await openSite(context, body);
    return DONE;
  });
  serve(router, contract.setPassword, async ({ body }) => {
    await setPassword(context, body);
    return DONE;
  });
}
