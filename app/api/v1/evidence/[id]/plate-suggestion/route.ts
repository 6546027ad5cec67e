import { evidenceId } from '@/lib/evidence/schema';
import { plateSuggestion } from '@/lib/evidence/tlc/proposal-schema';
import { suggestForEvidence } from '@/lib/evidence/tlc/suggest-for-evidence';
import { route } from '@/lib/http/route';

export const POST = route({
  summary: 'Proposed corners, lines, lanes and spots of a plate photo; saves nothing',
  params: evidenceId,
  response: plateSuggestion,
  handle: async ({ actor, params }) => ({ json: await suggestForEvidence(actor, params.id) }),
});
