import { fractionListQuery, fractionPageSchema } from '@/lib/distillation/fraction-schema';
import { listFractions } from '@/lib/distillation/list-fractions';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'Fractions of your groups, by filters',
  query: fractionListQuery,
  response: fractionPageSchema,
  handle: async ({ actor, query }) => ({ json: await listFractions(actor, query) }),
});
