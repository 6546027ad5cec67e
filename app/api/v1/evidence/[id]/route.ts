import { presentEvidenceAnswer } from '@/lib/evidence/present';
import { requirePlacedEvidence } from '@/lib/evidence/require-evidence';
import { evidenceAnswer, evidenceId } from '@/lib/evidence/schema';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'Facts about an evidence file',
  params: evidenceId,
  response: evidenceAnswer,
  handle: async ({ actor, params }) => {
    const { evidence, places } = await requirePlacedEvidence(actor, params.id);
    return { json: presentEvidenceAnswer(evidence, places) };
  },
});
