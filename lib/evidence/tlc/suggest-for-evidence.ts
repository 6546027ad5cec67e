import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { Problem } from '@/lib/errors';
import { readPhotoBytes } from '../read-photo-bytes';
import { requireEvidence } from '../require-evidence';
import type { PlateSuggestion } from './suggestion/suggestion';
import { suggestPlateFromFile } from './suggestion/suggest-plate-from-file';

/**
 * What could be marked on a stored plate photo; nothing is saved. 404 for a file that the actor may not see, 403, 422
 * for what is no plate photo, 429 and 503 when the server has too much to do.
 */
export async function suggestForEvidence(actor: Actor, id: string): Promise<PlateSuggestion> {
  const evidence = await requireEvidence(actor, id);
  authorise(actor, 'plate.write', evidence.groupId);
  if (evidence.kind !== 'plate-photo')
    throw new Problem(
      'invalid',
      'This file is no plate photo, so there is no plate to look for. Send it again with ?kind=plate-photo if it is one.',
    );
  return suggestPlateFromFile(await readPhotoBytes(evidence));
}
