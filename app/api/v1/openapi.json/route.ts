import { env } from '@/lib/env';
import { route } from '@/lib/http/route';
import { buildDocument } from '@/lib/openapi/build-document';
import { documentedRoutes } from './documented-routes';

export const GET = route({
  summary: 'This document: OpenAPI 3.1, made from the schemas that check the requests',
  access: 'public',
  responseType: 'application/json',
  handle: async () => ({
    json: buildDocument(documentedRoutes, env().publicUrl),
    headers: { 'cache-control': 'public, max-age=60' },
  }),
});
