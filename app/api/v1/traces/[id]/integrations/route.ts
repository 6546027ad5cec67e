import { integrateTrace } from '@/lib/evidence/gc/integrate-trace';
import { listIntegrations, readIntegration } from '@/lib/evidence/gc/queries';
import {
  integrationListQuery,
  integrationPageSchema,
  integrationSchema,
  newIntegrationSchema,
  traceParams,
} from '@/lib/evidence/gc/schema';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'Versions of the integration of a trace, the newest first',
  params: traceParams,
  query: integrationListQuery,
  response: integrationPageSchema,
  handle: async ({ actor, params, query }) => ({ json: await listIntegrations(actor, params.id, query) }),
});

export const POST = route({
  summary: 'Integrate a trace anew or assign its peaks: a new version with its reason, the old ones stay',
  params: traceParams,
  body: newIntegrationSchema,
  status: 201,
  response: integrationSchema,
  handle: async ({ actor, params, body }) => {
    const id = await integrateTrace(actor, params.id, body);
    return { json: await readIntegration(actor, id) };
  },
});
