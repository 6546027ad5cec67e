import { preferLiteratureValue } from '@/lib/compounds/prefer-literature-value';
import {
  literatureValueParams,
  literatureValueSchema,
  preferLiteratureValueSchema,
} from '@/lib/compounds/schema';
import { route } from '@/lib/http/route';
import { requireIfMatch } from '@/lib/http/version';

export const PATCH = route({
  summary: 'Make a literature value the preferred one of its property',
  params: literatureValueParams,
  body: preferLiteratureValueSchema,
  response: literatureValueSchema,
  handle: async ({ actor, params, body, request }) => ({
    json: await preferLiteratureValue(actor, params, requireIfMatch(request), body.reason),
  }),
});
