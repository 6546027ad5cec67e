import { rectifiedQuery, rectifiedResponse } from '@/lib/evidence/tlc/rectified-response';
import { plateId } from '@/lib/evidence/tlc/schema';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'A plate photo freed of perspective by its corners',
  params: plateId,
  query: rectifiedQuery,
  responseType: 'image/webp',
  handle: async ({ actor, params, query, request }) => rectifiedResponse(actor, params.id, query, request),
});
