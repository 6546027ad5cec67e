import { EvidenceFile } from '@/lib/database/records';
import { isPhotoType } from '@/lib/evidence/kinds';
import { Problem } from '@/lib/errors';
import { findOpenShare } from './find-open-share';
import { listFractionPlates } from './list-fraction-plates';

/**
 * A photo that belongs on the sheet behind a read-only link: of a plate with a lane of the fraction, or filed under the
 * fraction itself. One and the same 404 for anything else, and for a link that no longer works.
 */
export async function requireSharedPhoto(token: string, evidenceId: string): Promise<EvidenceFile> {
  const share = await findOpenShare(token);
  const photo = share && (await EvidenceFile.findByPk(evidenceId));
  if (photo && isPhotoType(photo.mediaType)) {
    if (photo.fractionId === share.fractionId) return photo;
    const plates = await listFractionPlates(share.fractionId);
    if (plates.some((plate) => plate.photos.some((each) => each.evidenceId === photo.id))) return photo;
  }
  throw new Problem(
    'not-found',
    'There is no such photo, or the link no longer works. Ask whoever sent it for a new one.',
  );
}
