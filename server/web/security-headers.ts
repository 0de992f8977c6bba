import { type RequestHandler } from 'express';
import helmet from 'helmet';
import { type Environment } from '#server/environment';

/** Scripts of our own only; styles may be inline because the framework writes them so. */
function contentPolicy(secure: boolean) {
  return {
    useDefaults: false,
    directives: {
      defaultSrc: ["'self'"],
      scriptSrc: ["'self'"],
      styleSrc: ["'self'", "'unsafe-inline'"],
      imgSrc: ["'self'", 'data:', 'blob:'],
      fontSrc: ["'self'"],
      connectSrc: ["'self'"],
      objectSrc: ["'none'"],
      frameSrc: ["'self'", 'blob:'],
      frameAncestors: ["'self'"],
      baseUri: ["'self'"],
      formAction: ["'self'"],
      ...(secure ? { upgradeInsecureRequests: [] } : {}),
    },
  };
}

/** The headers that need a secure origin are left out of a site that is reached without TLS. */
export function securityHeaders({ publicUrl }: Environment): RequestHandler {
  const secure = publicUrl?.startsWith('https:') ?? false;
  return helmet({
    contentSecurityPolicy: contentPolicy(secure),
    strictTransportSecurity: secure,
    crossOriginOpenerPolicy: secure,
    originAgentCluster: secure,
    referrerPolicy: { policy: 'same-origin' },
  });
}
