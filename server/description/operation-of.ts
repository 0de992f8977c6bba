import { type RouteConfig } from '@asteasolutions/zod-to-openapi';
import { type Endpoint } from '#shared/contract/endpoint';
import { ROLE_TITLES } from '#shared/contract/roles';
import * as z from 'zod';

type Described = Endpoint & { readonly area: string };

export const COOKIE_SCHEME = 'session';
export const TOKEN_SCHEME = 'rackToken';
const PROBLEM = { $ref: '#/components/responses/Problem' };

/** Who may call, in words. */
export function whoMay({ who }: Endpoint): string {
  if (who === 'anyone') return 'Anyone';
  if (who === 'signed-in') return 'Everybody who is signed in';
  if (who === 'rack') return 'A test rack, by its token';
  return who.map((role) => ROLE_TITLES[role]).join(', ');
}

/** `:id` as the description writes it, `{id}`. */
export function templateOf(path: string): string {
  return path.replaceAll(/:(\w+)/g, '{$1}');
}

/** The contract's parameters are objects; their type there is wider. */
function parameters(schema: z.ZodType): z.ZodObject | undefined {
  return schema instanceof z.ZodObject ? schema : undefined;
}

function requestOf(endpoint: Described): RouteConfig['request'] {
  const hasBody = !(endpoint.body instanceof z.ZodUndefined);
  return {
    params: parameters(endpoint.params),
    query: parameters(endpoint.query),
    ...(endpoint.versioned && {
      headers: z.object({ 'If-Match': z.string().meta({ description: 'The version that is changed, as "3".' }) }),
    }),
    ...(hasBody && { body: { required: true, content: { 'application/json': { schema: endpoint.body } } } }),
  };
}

function securityOf({ who }: Endpoint): Record<string, string[]>[] {
  if (who === 'anyone') return [];
  return [{ [who === 'rack' ? TOKEN_SCHEME : COOKIE_SCHEME]: [] }];
}

/** The refusals an endpoint can answer with, as far as its entry in the contract tells. */
function problemStatuses({ who, path, versioned, method }: Endpoint): number[] {
  return [
    400,
    ...(who === 'anyone' ? [] : [401, 403]),
    ...(path.includes(':') ? [404] : []),
    ...(method === 'GET' ? [] : [409, 422]),
    ...(versioned ? [412, 428] : []),
    ...(who === 'rack' ? [429] : []),
  ];
}

function responsesOf(endpoint: Described): RouteConfig['responses'] {
  const content =
    endpoint.media === undefined
      ? { 'application/json': { schema: endpoint.reply } }
      : { [endpoint.media]: { schema: { type: 'string' as const } } };
  return {
    [endpoint.status]: { description: 'Done.', content },
    ...Object.fromEntries(problemStatuses(endpoint).map((status) => [status, PROBLEM])),
    default: PROBLEM,
  };
}

/** One entry of the contract as an operation of the OpenAPI document. */
export function operationOf(name: string, endpoint: Described): RouteConfig {
  return {
    operationId: name,
    method: endpoint.method.toLowerCase() as Lowercase<Endpoint['method']>,
    path: templateOf(endpoint.path),
    tags: [endpoint.area],
    summary: endpoint.summary,
    description: `May be called by: ${whoMay(endpoint)}.`,
    security: securityOf(endpoint),
    request: requestOf(endpoint),
    responses: responsesOf(endpoint),
  };
}
