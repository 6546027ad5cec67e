import { previewResponse } from '@/lib/evidence/preview';
import { requireEvidence } from '@/lib/evidence/require-evidence';
import { evidenceId, previewQuery } from '@/lib/evidence/schema';
import { requirePhoto } from '@/lib/evidence/stream-content';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'A small picture of a photo, upright and without metadata',
  params: evidenceId,
  query: previewQuery,
  responseType: 'image/webp',
  handle: async ({ actor, params, query, request }) => {
    const evidence = await requireEvidence(actor, params.id);
    requirePhoto(evidence);
    return previewResponse(evidence, query.width, request);
  },
});
