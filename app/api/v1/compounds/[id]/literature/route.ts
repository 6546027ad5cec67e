import { addLiteratureValue } from '@/lib/compounds/add-literature-value';
import { listLiterature } from '@/lib/compounds/list-literature';
import {
  compoundParams,
  literatureListQuery,
  literaturePageSchema,
  literatureValueSchema,
  newLiteratureValueSchema,
} from '@/lib/compounds/schema';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'Literature values of a compound with conditions and source, corrected ones included',
  params: compoundParams,
  query: literatureListQuery,
  response: literaturePageSchema,
  handle: async ({ actor, params, query }) => ({ json: await listLiterature(actor, params.id, query) }),
});

export const POST = route({
  summary: 'Add a literature value, or correct one; the corrected one stays',
  params: compoundParams,
  body: newLiteratureValueSchema,
  response: literatureValueSchema,
  status: 201,
  handle: async ({ actor, params, body }) => ({ json: await addLiteratureValue(actor, params.id, body) }),
});
