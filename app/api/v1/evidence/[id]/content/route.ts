import { requireEvidence } from '@/lib/evidence/require-evidence';
import { evidenceId } from '@/lib/evidence/schema';
import { streamContent } from '@/lib/evidence/stream-content';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'The original bytes of an evidence file, whole or a range of them',
  params: evidenceId,
  responseType: 'application/octet-stream',
  handle: async ({ actor, params, request }) =>
    streamContent(await requireEvidence(actor, params.id), request),
});
