import { changeCompound } from '@/lib/compounds/change-compound';
import { readCompound } from '@/lib/compounds/read-compound';
import { compoundChangeSchema, compoundParams, compoundSchema } from '@/lib/compounds/schema';
import { route } from '@/lib/http/route';
import { entityTag, requireIfMatch } from '@/lib/http/version';

export const GET = route({
  summary: 'A compound with its hazards and what a plate can show of it',
  params: compoundParams,
  response: compoundSchema,
  handle: async ({ actor, params }) => {
    const compound = await readCompound(actor, params.id);
    return { json: compound, headers: { etag: entityTag(compound) } };
  },
});

export const PATCH = route({
  summary: 'Change a compound',
  params: compoundParams,
  body: compoundChangeSchema,
  response: compoundSchema,
  handle: async ({ actor, params, body, request }) => {
    const compound = await changeCompound(actor, params.id, requireIfMatch(request), body);
    return { json: compound, headers: { etag: entityTag(compound) } };
  },
});
