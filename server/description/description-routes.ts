import { type Context } from '#server/context';
import { serve } from '#server/serve';
import { programVersion } from '#server/site/front';
import { readDescription, readDocumentation } from '#shared/contract/description';
import { type Router } from 'express';
import { documentationPage } from './documentation-page';
import { type OpenApiDocument, openApiDocument } from './openapi-document';

/** The description does not change while the program runs; it is made when it is first asked for. */
function once<T>(make: () => T): () => T {
  let made: { value: T } | undefined;
  return () => (made ??= { value: make() }).value;
}

export function descriptionRoutes(router: Router, { environment }: Context): void {
  const document = once(() => openApiDocument(programVersion(environment.root)));
  const page = once(() => Buffer.from(documentationPage(document())));
  serve(router, readDescription, () => ({ ...document() }) satisfies OpenApiDocument);
  serve(router, readDocumentation, () => ({ bytes: page(), fileName: 'quietrail-interface.html' }));
}
