import { computeBoilingPoint } from '@/lib/distillation/planner/compute-boiling';
import { boilingPointBody, boilingPointSchema } from '@/lib/distillation/planner/schema';
import { route } from '@/lib/http/route';

export const POST = route({
  summary: 'Boiling point at a pressure; nothing is saved',
  token: 'any',
  body: boilingPointBody,
  response: boilingPointSchema,
  handle: async ({ body }) => ({ json: await computeBoilingPoint(body) }),
});
