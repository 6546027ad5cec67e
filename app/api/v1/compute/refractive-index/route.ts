import { computeRefractiveIndex } from '@/lib/distillation/planner/compute-refractive-index';
import { refractiveIndexBody, refractiveIndexSchema } from '@/lib/distillation/planner/schema';
import { route } from '@/lib/http/route';

export const POST = route({
  summary: 'A refractive index carried to the temperature of the literature value; nothing is saved',
  token: 'any',
  body: refractiveIndexBody,
  response: refractiveIndexSchema,
  handle: async ({ body }) => ({ json: await computeRefractiveIndex(body) }),
});
