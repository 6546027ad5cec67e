import { createFraction } from '@/lib/distillation/create-fraction';
import {
  fractionSchema,
  fractionsOfRunQuery,
  fractionsOfRunSchema,
  newFractionSchema,
} from '@/lib/distillation/fraction-schema';
import { listFractionsOfRun } from '@/lib/distillation/list-fractions-of-run';
import { presentFraction } from '@/lib/distillation/present';
import { codeParams } from '@/lib/distillation/quantities';
import { requireFraction } from '@/lib/distillation/require-fraction';
import { route } from '@/lib/http/route';
import { entityTag } from '@/lib/http/version';

export const GET = route({
  summary: 'Fractions of a run, in the order of their numbers',
  params: codeParams,
  query: fractionsOfRunQuery,
  response: fractionsOfRunSchema,
  handle: async ({ actor, params, query }) => ({
    json: await listFractionsOfRun(actor, params.code, query),
  }),
});

export const POST = route({
  summary: 'Start a fraction: a receiver was put on',
  params: codeParams,
  body: newFractionSchema,
  response: fractionSchema,
  status: 201,
  handle: async ({ actor, params, body }) => {
    const { code } = await createFraction(actor, params.code, body);
    const fraction = await requireFraction(actor, code);
    const headers = { etag: entityTag(fraction), location: `/api/v1/fractions/${code}` };
    return { json: presentFraction(fraction), headers };
  },
});
