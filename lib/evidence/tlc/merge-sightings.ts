import { compareRf } from './agree';

/** One spot as one photo shows it. */
export type Sighting = {
  photoId: string;
  evidenceId: string;
  visualiser: string;
  /** Its number among the lane's spots in that photo, from 0. */
  index: number;
  rf: number;
  rfUncertainty: number;
};

/** One spot of a lane, however many photos show it. */
export type DistinctSpot = { rf: number; rfUncertainty: number; seenIn: Sighting[] };

/**
 * The spots of one lane over all photos of its plate: spots of two photos are one where their Rf agree within the
 * combined uncertainty, nearest pairs first, and never two of the same photo. Rf and uncertainty are those of the
 * most certain sighting: photos share baseline and front, so their mean would claim too much. In the order of Rf.
 */
export function mergeSightings(sightings: readonly Sighting[]): DistinctSpot[] {
  const groups: Sighting[][] = sightings.map((one) => [one]);
  const pairs = sightings
    .flatMap((one, i) =>
      sightings.slice(i + 1).flatMap((other, k) => {
        if (one.photoId === other.photoId) return [];
        const agreement = compareRf(one, other, true);
        if (agreement.state !== 'agree') return [];
        return [{ a: one, b: other, apart: Math.abs(agreement.difference), order: i * sightings.length + k }];
      }),
    )
    .sort((p, q) => p.apart - q.apart || p.order - q.order);
  const groupOf = (sighting: Sighting) => groups.find((group) => group.includes(sighting))!;
  for (const { a, b } of pairs) {
    const [one, other] = [groupOf(a), groupOf(b)];
    if (one === other) continue;
    const photos = new Set(one.map((sighting) => sighting.photoId));
    if (other.some((sighting) => photos.has(sighting.photoId))) continue;
    one.push(...other);
    groups.splice(groups.indexOf(other), 1);
  }
  return groups
    .map((seenIn) => {
      const best = seenIn.reduce((least, one) => (one.rfUncertainty < least.rfUncertainty ? one : least));
      return { rf: best.rf, rfUncertainty: best.rfUncertainty, seenIn };
    })
    .sort((a, b) => a.rf - b.rf);
}
