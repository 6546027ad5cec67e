import { readIntegration } from '@/lib/evidence/gc/queries';
import { integrationSchema, traceParams } from '@/lib/evidence/gc/schema';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'One version of the integration of a trace',
  params: traceParams,
  response: integrationSchema,
  handle: async ({ actor, params }) => ({ json: await readIntegration(actor, params.id) }),
});
