import { listPlates } from '@/lib/evidence/tlc/list-plates';
import { markPlate } from '@/lib/evidence/tlc/mark-plate';
import {
  plateBody,
  plateListQuery,
  plateListResponse,
  plateResponse,
  runCode,
} from '@/lib/evidence/tlc/schema';
import { route } from '@/lib/http/route';
import { entityTag } from '@/lib/http/version';

export const GET = route({
  summary: 'The plates of a run, the newest first',
  params: runCode,
  query: plateListQuery,
  response: plateListResponse,
  handle: async ({ actor, params, query }) => ({ json: await listPlates(actor, params.code, query) }),
});

export const POST = route({
  summary: 'Mark a plate: its lines, lanes and spots; the answer holds Rf with its uncertainty',
  params: runCode,
  body: plateBody,
  status: 201,
  response: plateResponse,
  handle: async ({ actor, params, body }) => {
    const plate = await markPlate(actor, params.code, body);
    return { json: plate, headers: { location: `/api/v1/plates/${plate.id}`, etag: entityTag(plate) } };
  },
});
