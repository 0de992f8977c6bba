import { OpenAPIRegistry, OpenApiGeneratorV31 } from '@asteasolutions/zod-to-openapi';
import { ACCESS_COOKIE } from '#server/sessions/session-cookies';
import { ENDPOINTS } from '#shared/contract/index';
import { problem } from '#shared/contract/problem';
import * as z from 'zod';
import { COOKIE_SCHEME, operationOf, TOKEN_SCHEME } from './operation-of';

type Generated = ReturnType<OpenApiGeneratorV31['generateDocument']>;
export type OpenApiDocument = Omit<Generated, 'components'> & { components: object };

const ABOUT =
  'Every endpoint of Quietrail. Values are in SI base units, ratios are fractions, instants are UTC. Refusals are ' +
  'problem details (RFC 9457) with a stable code and, for input, the path of each fault. An edit names the version it ' +
  'changes in If-Match. /api/events streams the counts of /api/counts as server-sent events named "counts", and the id of ' +
  'each lot that changes as events named "lot". People sign in and are known by a cookie; a test rack sends its token as ' +
  'Authorization: Bearer.';

function refusal() {
  return {
    description: 'A refusal.',
    content: { 'application/problem+json': { schema: z.toJSONSchema(problem) } },
  };
}

/** The contract as an OpenAPI 3.1 document. */
export function openApiDocument(version: string): OpenApiDocument {
  const registry = new OpenAPIRegistry();
  registry.registerComponent('securitySchemes', COOKIE_SCHEME, { type: 'apiKey', in: 'cookie', name: ACCESS_COOKIE });
  registry.registerComponent('securitySchemes', TOKEN_SCHEME, { type: 'http', scheme: 'bearer' });
  for (const [name, endpoint] of ENDPOINTS) registry.registerPath(operationOf(name, endpoint));
  const document = new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: { title: 'Quietrail', version, description: ABOUT },
  });
  return { ...document, components: { ...document.components, responses: { Problem: refusal() } } };
}
