import { readTrace } from '@/lib/evidence/gc/queries';
import { traceParams, traceSchema } from '@/lib/evidence/gc/schema';
import { route } from '@/lib/http/route';
import { entityTag } from '@/lib/http/version';

export const GET = route({
  summary: 'A trace with its integration in force',
  params: traceParams,
  response: traceSchema,
  handle: async ({ actor, params }) => {
    const trace = await readTrace(actor, params.id);
    return { json: trace, headers: { etag: entityTag(trace) } };
  },
});
