import { ENDPOINTS } from '#shared/contract/index';
import express, { type RequestHandler } from 'express';

const USUAL = '200kb';
const LARGE = '25mb';

function patternOf(path: string): RegExp {
  return new RegExp(`^${path.replaceAll(/:\w+/g, '[^/]+')}/?$`);
}

/** Reads JSON bodies; large ones only from people who are signed in and from racks, and only where the contract expects them. */
export function jsonBody(): RequestHandler {
  const usual = express.json({ limit: USUAL });
  const large = express.json({ limit: LARGE });
  const patterns = [...ENDPOINTS.values()].filter((endpoint) => endpoint.large).map(({ path }) => patternOf(path));
  return (request, response, next) => {
    const path = request.baseUrl + request.path;
    const mayBeLarge = (request.caller ?? request.rack) !== undefined && patterns.some((pattern) => pattern.test(path));
    (mayBeLarge ? large : usual)(request, response, next);
  };
}
