import { compareRf } from '@/lib/evidence/tlc/agree';
import { findVisualiser, type Visualiser, visibilityOnPlate } from '@/lib/evidence/tlc/visualisers';
import type { CompoundFacts, CoverageCell, LaneInput } from '../judge-inputs';

function sightOf(visualiser: Visualiser, compound: CompoundFacts): { sees: boolean; reason: string } {
  if (compound.normalBoilingPointC === null)
    return {
      sees: false,
      reason: `No literature value for the boiling point of ${compound.name}: it may have left the plate.`,
    };
  const sight = visibilityOnPlate({
    visualiser,
    features: compound.plateFeatures,
    normalBoilingPointC: compound.normalBoilingPointC,
  });
  const unsure = sight.state === 'uncertain' ? 'Not sure, so it counts as blind: ' : '';
  return { sees: sight.state === 'sees', reason: `${unsure}${sight.reason}` };
}

/**
 * What a photo of the fraction's lane shows of a compound. A visible compound that runs with the target, as
 * its reference on the same plate shows, is not seen: one spot for both.
 */
export function tlcCell(lane: LaneInput, compound: CompoundFacts): CoverageCell {
  const visualiser = findVisualiser(lane.visualiserId);
  const test = `TLC, ${visualiser?.name ?? lane.visualiserId}`;
  if (!visualiser)
    return { test, state: 'blind', reason: `What "${lane.visualiserId}" shows is not known here.` };
  const sight = sightOf(visualiser, compound);
  if (!sight.sees) return { test, state: 'blind', reason: sight.reason };
  const spots = lane.references.filter((ref) => ref.compoundId === compound.id).flatMap((ref) => ref.spots);
  if (spots.length === 0) {
    const reason = `${sight.reason} No reference of it on this plate shows that it runs apart from the target; no amount can be stated.`;
    return { test, state: 'sees', reason };
  }
  // The highest spot of a lane with one is the target; with more of them the lane itself shows the separation.
  const [only] = lane.spots;
  const together =
    lane.spots.length === 1 && only && spots.some((spot) => compareRf(spot, only, true).state === 'agree');
  return together
    ? {
        test,
        state: 'blind',
        reason: `Its reference runs to Rf ${spots[0]?.rf.toFixed(2)}, the same place as the target: one spot for both.`,
      }
    : {
        test,
        state: 'sees',
        reason: `${sight.reason} Its reference on this plate runs apart from the target.`,
      };
}

/** A visualiser that was not used: whether it would show the compound. */
export function tlcNotDone(visualiser: Visualiser, compound: CompoundFacts): CoverageCell {
  const sight = sightOf(visualiser, compound);
  const would = sight.sees ? 'it would see it' : 'it would not help';
  return {
    test: `TLC, ${visualiser.name}`,
    state: 'not done',
    wouldSee: sight.sees,
    reason: `Not done; ${would}: ${sight.reason}`,
  };
}
