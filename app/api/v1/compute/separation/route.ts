import { computeSeparation } from '@/lib/distillation/planner/compute-separation';
import { separationBody, separationSchema } from '@/lib/distillation/planner/schema';
import { route } from '@/lib/http/route';

export const POST = route({
  summary: 'How well two liquids part at a pressure; nothing is saved',
  token: 'any',
  body: separationBody,
  response: separationSchema,
  handle: async ({ body }) => ({ json: await computeSeparation(body) }),
});
