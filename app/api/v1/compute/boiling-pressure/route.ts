import { computeBoilingPressure } from '@/lib/distillation/planner/compute-boiling';
import { boilingPressureBody, boilingPressureSchema } from '@/lib/distillation/planner/schema';
import { route } from '@/lib/http/route';

export const POST = route({
  summary: 'Pressure at which a liquid boils at a temperature; nothing is saved',
  token: 'any',
  body: boilingPressureBody,
  response: boilingPressureSchema,
  handle: async ({ body }) => ({ json: await computeBoilingPressure(body) }),
});
