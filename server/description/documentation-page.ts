import { type Endpoint } from '#shared/contract/endpoint';
import { ENDPOINTS } from '#shared/contract/index';
import { escape } from './escape';
import { type OpenApiDocument } from './openapi-document';
import { templateOf, whoMay } from './operation-of';
import { rackSection } from './rack-section';
import { type Field, fieldsOf, type Schema } from './schema-fields';

const STYLE = `
  :root { color-scheme: light dark }
  body { font: 16px/1.5 Roboto, system-ui, sans-serif; max-width: 60rem; margin: 2rem auto; padding: 0 1rem }
  code, h3 { font-family: 'Roboto Mono', ui-monospace, monospace }
  h2 { margin-top: 3rem }
  h2::first-letter { text-transform: capitalize }
  h3 { font-size: 1rem; margin: 2rem 0 0; overflow-wrap: anywhere }
  p { margin: .25rem 0 }
  .frame { overflow-x: auto }
  pre { margin: .5rem 0; padding: .5rem .75rem; overflow-x: auto; font: 13px/1.5 'Roboto Mono', ui-monospace, monospace; border: 1px solid; border-color: color-mix(in srgb, currentColor 20%, transparent) }
  li { margin-bottom: 1.5rem }
  table { border-collapse: collapse; margin: .5rem 0; font-size: .875rem }
  caption, th { text-align: left; font-weight: 500 }
  th, td { padding: .125rem 1.5rem .125rem 0; border-bottom: 1px solid; border-color: color-mix(in srgb, currentColor 20%, transparent); vertical-align: top }
`;

function table(caption: string, fields: readonly Field[]): string {
  if (fields.length === 0) return '';
  const rows = fields.map(
    ({ place, type, required }) =>
      `<tr><td><code>${escape(place)}</code></td><td>${escape(type)}</td><td>${required ? 'required' : 'optional'}</td></tr>`,
  );
  return `<div class="frame" tabindex="0"><table><caption>${caption}</caption><thead><tr><th scope="col">Field</th><th scope="col">Type</th><th scope="col">Needed</th></tr></thead><tbody>${rows.join('')}</tbody></table></div>`;
}

/** What a page needs of an operation; the document's own types allow references where this one has none. */
interface Operation {
  parameters?: { in: string; name: string; required?: boolean; schema: Schema }[];
  requestBody?: { content: { 'application/json'?: { schema: Schema } } };
}

function parameterFields({ parameters = [] }: Operation, place: string): Field[] {
  return parameters
    .filter((parameter) => parameter.in === place)
    .map(({ name, required, schema }) => {
      const [field] = fieldsOf({ properties: { [name]: schema }, required: required ? [name] : [] });
      return field ?? { place: name, type: 'anything', required: false };
    });
}

function section(endpoint: Endpoint, operation: Operation): string {
  const body = operation.requestBody?.content['application/json']?.schema;
  return [
    `<h3>${endpoint.method} ${escape(templateOf(endpoint.path))}</h3>`,
    `<p>${escape(endpoint.summary)}</p>`,
    `<p>For: ${escape(whoMay(endpoint))}. Answers ${endpoint.status}.</p>`,
    table('In the path', parameterFields(operation, 'path')),
    table('In the query', parameterFields(operation, 'query')),
    table('In the headers', parameterFields(operation, 'header')),
    table('In the body', body ? fieldsOf(body) : []),
  ].join('\n');
}

function operationIn(document: OpenApiDocument, endpoint: Endpoint): Operation {
  const methods = document.paths?.[templateOf(endpoint.path)] as Record<string, Operation> | undefined;
  return methods?.[endpoint.method.toLowerCase()] ?? {};
}

/** The interface as a page to read: no script, every endpoint under its area. */
export function documentationPage(document: OpenApiDocument): string {
  const endpoints = [...ENDPOINTS.values()];
  const areas = [...new Set(endpoints.map(({ area }) => area))];
  const parts = areas.map((area) => {
    const own = endpoints.filter((endpoint) => endpoint.area === area);
    return `<section><h2>${escape(area)}</h2>${own.map((one) => section(one, operationIn(document, one))).join('\n')}</section>`;
  });
  const about = escape(document.info.description ?? '');
  return `<!doctype html>
<html lang="en">
<head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1">
<title>Quietrail interface</title><style>${STYLE}</style></head>
<body><main><h1>Quietrail interface</h1><p>${about}</p><p><a href="/api/openapi.json">OpenAPI document</a></p>
${rackSection()}
${parts.join('\n')}
</main></body></html>`;
}
