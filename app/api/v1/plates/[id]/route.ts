import { changePlate } from '@/lib/evidence/tlc/change-plate';
import { viewPlate } from '@/lib/evidence/tlc/require-plate';
import { plateChange, plateId, plateResponse } from '@/lib/evidence/tlc/schema';
import { route } from '@/lib/http/route';
import { entityTag, requireIfMatch } from '@/lib/http/version';

export const GET = route({
  summary: 'A plate with its photos, lanes, spots and their Rf',
  params: plateId,
  response: plateResponse,
  handle: async ({ actor, params }) => {
    const plate = await viewPlate(actor, params.id);
    return { json: plate, headers: { etag: entityTag(plate) } };
  },
});

export const PATCH = route({
  summary: 'Replace the marks of a photo of a plate, or add a photo to it',
  params: plateId,
  body: plateChange,
  response: plateResponse,
  handle: async ({ actor, params, body, request }) => {
    const plate = await changePlate(actor, params.id, requireIfMatch(request), body);
    return { json: plate, headers: { etag: entityTag(plate) } };
  },
});
