import { addCompound } from '@/lib/compounds/add-compound';
import { listCompounds } from '@/lib/compounds/list-compounds';
import {
  compoundListQuery,
  compoundPageSchema,
  compoundSchema,
  newCompoundSchema,
} from '@/lib/compounds/schema';
import { route } from '@/lib/http/route';
import { entityTag } from '@/lib/http/version';

export const GET = route({
  summary: 'Compounds by name, synonym, CAS number, InChIKey or formula',
  query: compoundListQuery,
  response: compoundPageSchema,
  handle: async ({ actor, query }) => ({ json: await listCompounds(actor, query) }),
});

export const POST = route({
  summary: 'Add a compound; its number, formula, mass and structure are checked against each other',
  body: newCompoundSchema,
  response: compoundSchema,
  status: 201,
  handle: async ({ actor, body }) => {
    const compound = await addCompound(actor, body);
    return {
      json: compound,
      headers: { location: `/api/v1/compounds/${compound.id}`, etag: entityTag(compound) },
    };
  },
});
