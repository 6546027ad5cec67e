import { createRun } from '@/lib/distillation/create-run';
import { listRuns } from '@/lib/distillation/list-runs';
import { presentRun } from '@/lib/distillation/present';
import { requireRun } from '@/lib/distillation/require-run';
import { newRunSchema, runListQuery, runPageSchema, runSchema } from '@/lib/distillation/schema';
import { route } from '@/lib/http/route';
import { entityTag } from '@/lib/http/version';

export const GET = route({
  summary: 'Runs of your groups, the latest first',
  query: runListQuery,
  response: runPageSchema,
  handle: async ({ actor, query }) => ({ json: await listRuns(actor, query) }),
});

export const POST = route({
  summary: 'Start a run',
  body: newRunSchema,
  response: runSchema,
  status: 201,
  handle: async ({ actor, body }) => {
    const { code } = await createRun(actor, body);
    const run = await requireRun(actor, code);
    const headers = { etag: entityTag(run), location: `/api/v1/runs/${code}` };
    return { json: presentRun(run), headers };
  },
});
