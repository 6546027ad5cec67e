import { readPoints } from '@/lib/evidence/gc/read-points';
import { pointsQuery, pointsSchema, traceParams } from '@/lib/evidence/gc/schema';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'Points of a trace, thinned for a picture so that every extreme stays',
  params: traceParams,
  query: pointsQuery,
  response: pointsSchema,
  handle: async ({ actor, params, query }) => ({ json: await readPoints(actor, params.id, query) }),
});
