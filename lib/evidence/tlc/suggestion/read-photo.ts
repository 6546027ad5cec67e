import { openPhoto } from '../../photo-decoder';
import { suggestPlate, WORKING_LONG_PX } from './suggest-plate';
import type { PlateSuggestion } from './suggestion';
import type { Point } from '../polyline';

/**
 * Decodes a photo at the working size, turned as its EXIF orientation says, and looks for a plate. JPEG is shrunk
 * while it is decoded, which saves most of the time of a full decode. Places come back in pixels of the whole
 * photo as shown. Throws what the decoder throws for a damaged photo. Meant for a worker thread.
 */
export async function suggestFromPhoto(source: string | Buffer): Promise<PlateSuggestion> {
  const { autoOrient: whole } = await openPhoto(source).metadata();
  const { data, info } = await openPhoto(source)
    .resize({ width: WORKING_LONG_PX, height: WORKING_LONG_PX, fit: 'inside', withoutEnlargement: true })
    .removeAlpha()
    .toColourspace('srgb')
    .raw()
    .toBuffer({ resolveWithObject: true });
  const suggestion = suggestPlate({ data, width: info.width, height: info.height });
  return scaleSuggestion(suggestion, whole.width / info.width, whole.height / info.height);
}

function scaleSuggestion(suggestion: PlateSuggestion, scaleX: number, scaleY: number): PlateSuggestion {
  const scale = <T extends Point>(p: T): T => ({ ...p, x: p.x * scaleX, y: p.y * scaleY });
  return {
    ...suggestion,
    corners: suggestion.corners.map(scale),
    baseline: suggestion.baseline.map(scale),
    front: suggestion.front.map(scale),
    lanes: suggestion.lanes.map((lane) => ({ ...scale(lane), spots: lane.spots.map(scale) })),
  };
}
