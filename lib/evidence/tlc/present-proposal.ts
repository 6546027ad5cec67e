import { diffProposal } from './diff-proposal';
import { plateProposal } from './proposal-schema';
import type { PlatePhotoView } from './schema';

type Marks = Parameters<typeof diffProposal>[1] & { units: 'px' | 'mm' };

/**
 * What became of the marks that were proposed for a photo, from the proposal as it is kept; null where nothing was
 * proposed, or where the marks are in millimetres and cannot be compared with places in the photo.
 */
export function presentProposal(proposal: unknown, marks: Marks): PlatePhotoView['proposal'] {
  const kept = plateProposal.safeParse(proposal);
  if (!kept.success || marks.units !== 'px') return null;
  return { ...diffProposal(kept.data, marks), methodVersion: kept.data.methodVersion ?? null };
}
