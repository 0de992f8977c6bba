import { type RequestHandler } from 'express';
import { createSecretKey } from 'node:crypto';
import passport from 'passport';
import { Strategy, type VerifiedCallback } from 'passport-jwt';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { type AccessClaims } from './access-token';
import { ACCESS_COOKIE, cookieOf } from './session-cookies';
import { callerFinder } from './session-queries';

function strategy({ db, clock, environment }: Context): Strategy {
  const findCaller = callerFinder(db);
  const verify = (claims: AccessClaims, done: VerifiedCallback) => {
    const now = clock.now();
    const alive = claims.exp * 1000 > now.getTime();
    done(null, alive && (findCaller(claims.session, now) ?? false));
  };
  return new Strategy(
    {
      jwtFromRequest: (request) => cookieOf(request, ACCESS_COOKIE) ?? null,
      // The key is made once: a secret given as text would be tried as a public key first, at every request.
      secretOrKey: createSecretKey(Buffer.from(environment.secret)) as unknown as Buffer,
      algorithms: ['HS256'],
      // The end is checked above, by the clock of the context.
      ignoreExpiration: true,
    },
    verify,
  );
}

/** Says who calls, when the access cookie is a good one; whether somebody must be known is the endpoint's to say. */
export function attachCaller(context: Context): RequestHandler {
  const guard = new passport.Passport().use(strategy(context));
  return (request, response, next) => {
    const attach = (error: unknown, caller: Caller | false) => {
      if (error) {
        next(error);
        return;
      }
      if (caller) request.caller = caller;
      next();
    };
    const authenticate = guard.authenticate('jwt', { session: false }, attach) as RequestHandler;
    void authenticate(request, response, next);
  };
}
