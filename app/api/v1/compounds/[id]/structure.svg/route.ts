import { z } from 'zod';
import { compoundParams } from '@/lib/compounds/schema';
import { structureResponse } from '@/lib/compounds/structure-response';
import { route } from '@/lib/http/route';

const side = z.coerce.number().int().min(40).max(2000);

export const GET = route({
  summary: 'The drawn structure of a compound',
  params: compoundParams,
  query: z.strictObject({ width: side.default(320), height: side.default(220) }),
  responseType: 'image/svg+xml',
  handle: async ({ actor, params, query, request }) =>
    structureResponse(actor, params.id, query, request.headers.get('if-none-match')),
});
