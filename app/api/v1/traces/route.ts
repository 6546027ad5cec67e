import { createTrace } from '@/lib/evidence/gc/create-trace';
import { listTraces, readTrace } from '@/lib/evidence/gc/queries';
import { newTraceSchema, traceListQuery, tracePageSchema, traceSchema } from '@/lib/evidence/gc/schema';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'Traces of your groups, the newest first',
  query: traceListQuery,
  response: tracePageSchema,
  handle: async ({ actor, query }) => ({ json: await listTraces(actor, query) }),
});

export const POST = route({
  summary: 'Read a gas chromatogram from an evidence file; 200 when it had been read just so already',
  body: newTraceSchema,
  status: 201,
  response: traceSchema,
  handle: async ({ actor, body }) => {
    const { traceId, changed } = await createTrace(actor, body);
    return { status: changed ? 201 : 200, json: await readTrace(actor, traceId) };
  },
});
