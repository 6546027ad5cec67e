import { cautionQuery, cautionsSchema } from '@/lib/distillation/caution-schema';
import { findCautions } from '@/lib/distillation/find-cautions';
import { requirePerson } from '@/lib/auth/require-person';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'The usual cautions for a still as planned, from recorded hazards; never a permission',
  query: cautionQuery,
  response: cautionsSchema,
  handle: async ({ actor, query }) => {
    requirePerson(actor);
    const still = {
      compoundIds: query.compounds,
      heatingTemperatureC: query.heatingTemperatureC ?? null,
      pressureMbar: query.pressureMbar ?? null,
    };
    return { json: { cautions: await findCautions(still) } };
  },
});
