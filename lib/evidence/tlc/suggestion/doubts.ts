import type { FoundPlate } from './find-plate';
import type { FoundSpot } from './find-spots';
import type { OrientedPlate } from './orient-plate';

/** How far the parts of a suggestion are to be trusted, and what to check, in words for the user. */
export function doubtsOf(
  plate: FoundPlate,
  { lines, onItsSide }: OrientedPlate,
  spots: readonly FoundSpot[],
): { confidence: number; reasons: string[] } {
  const reasons: string[] = [];
  if (plate.fillsPhoto) {
    reasons.push(
      'No edges of the plate are seen: the border of the photo is taken for the plate. Move the corners if that is wrong.',
    );
  } else if (plate.confidence < 0.85) {
    reasons.push('The edges of the plate are seen in part only: check the corners.');
  }
  if (onItsSide)
    reasons.push('The plate lies on its side in the photo: check that baseline and front are not swapped.');
  if (!lines.baseline) reasons.push('No baseline is seen: draw it.');
  else if (lines.baseline.confidence < 0.7) reasons.push('The baseline is faint: check it.');
  if (!lines.front) reasons.push('No solvent front is seen: draw it.');
  else if (lines.front.confidence < 0.7) reasons.push('The solvent front is faint: check it.');
  const faint = spots.filter((spot) => spot.toNoise < 12).length;
  if (faint > 0) reasons.push(`${faint} of ${spots.length} spots hardly stand out: check them.`);
  const streaks = spots.filter((spot) => spot.shape === 'streak').length;
  if (streaks > 0)
    reasons.push(`${streaks} of ${spots.length} spots trail a streak: check where their centre is.`);
  if (spots.length === 0) reasons.push('No spot stands out of the noise.');
  const least = Math.min(plate.confidence, lines.baseline?.confidence ?? 0.1, lines.front?.confidence ?? 0.1);
  const ofSpots = spots.length === 0 ? 1 : 1 - 0.3 * (faint / spots.length);
  return { confidence: least * ofSpots * (onItsSide ? 0.8 : 1), reasons };
}
