import { previewTrace } from '@/lib/evidence/gc/read-points';
import { tracePreviewBody, tracePreviewSchema } from '@/lib/evidence/gc/schema';
import { evidenceId } from '@/lib/evidence/schema';
import { route } from '@/lib/http/route';

export const POST = route({
  summary: 'How a trace file would be read, to be confirmed; nothing is saved',
  params: evidenceId,
  body: tracePreviewBody,
  response: tracePreviewSchema,
  handle: async ({ actor, params, body }) => ({
    json: await previewTrace(actor, params.id, body.read ?? {}),
  }),
});
