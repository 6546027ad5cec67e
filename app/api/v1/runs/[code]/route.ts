import { changeRun } from '@/lib/distillation/change-run';
import { requirePerson } from '@/lib/auth/require-person';
import { presentRun } from '@/lib/distillation/present';
import { codeParams } from '@/lib/distillation/quantities';
import { requireRun } from '@/lib/distillation/require-run';
import { runChangeSchema, runSchema } from '@/lib/distillation/schema';
import { route } from '@/lib/http/route';
import { entityTag, requireIfMatch } from '@/lib/http/version';

export const GET = route({
  summary: 'One run with its target, known impurities and people',
  params: codeParams,
  response: runSchema,
  handle: async ({ actor, params }) => {
    const run = await requireRun(requirePerson(actor), params.code);
    return { json: presentRun(run), headers: { etag: entityTag(run) } };
  },
});

export const PATCH = route({
  summary: 'Change a run; send the version that you changed as If-Match',
  params: codeParams,
  body: runChangeSchema,
  response: runSchema,
  handle: async ({ actor, params, body, request }) => {
    await changeRun(actor, params.code, body, requireIfMatch(request));
    const run = await requireRun(actor, params.code);
    return { json: presentRun(run), headers: { etag: entityTag(run) } };
  },
});
