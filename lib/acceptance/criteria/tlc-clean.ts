import { z } from 'zod';
import { findVisualiser, VISUALISERS, visibilityOnPlate } from '@/lib/evidence/tlc/visualisers';
import type { CriterionResult, JudgeInputs, LaneInput } from '../judge-inputs';
import { worstOf } from './gc-main-peak';
import { criterion } from './kind';

const ids = VISUALISERS.map((visualiser) => visualiser.id) as [string, ...string[]];

function judgeLane(
  lane: LaneInput,
  inputs: JudgeInputs,
  facts: Omit<CriterionResult, 'state' | 'reason' | 'measured'>,
  visualiserIds: readonly string[],
): CriterionResult {
  const count = lane.spots.length;
  const measured =
    count === 0
      ? 'no spot'
      : `${count} ${count === 1 ? 'spot' : 'spots'}, Rf ${lane.spots.map((spot) => spot.rf.toFixed(2)).join(', ')}`;
  const worst = Math.max(0, ...lane.spots.map((spot) => spot.rfUncertainty));
  const known = { ...facts, measured, uncertainty: count === 0 ? null : `± ${(2 * worst).toFixed(3)} in Rf` };
  if (count > 1)
    return { ...known, state: 'fail', reason: `Lane ${lane.laneLabel} shows more than one spot.` };
  const visualiser = findVisualiser(lane.visualiserId);
  const sight = visualiser
    ? visibilityOnPlate({
        visualiser,
        features: inputs.target.plateFeatures,
        normalBoilingPointC: inputs.target.normalBoilingPointC,
      })
    : null;
  if (count === 0) {
    const why = sight && sight.state !== 'sees' ? ` ${inputs.target.name}: ${sight.reason}` : '';
    const reason = `Lane ${lane.laneLabel} shows nothing, not even the target, so it proves nothing.${why}`;
    return { ...known, state: sight?.state === 'blind' ? 'blind' : 'inconclusive', reason };
  }
  const [other] = lane.elsewhere ?? [];
  if (other) {
    const names = other.visualiserIds.map((id) => findVisualiser(id)?.name ?? id).join(', ');
    // Where every visualiser asked for must see one spot, they must all see the same one.
    const asked = other.visualiserIds.some((id) => visualiserIds.includes(id));
    const seen = `Lane ${lane.laneLabel} shows one spot here, but ${names} shows another at Rf ${other.rf.toFixed(2)} on the same plate`;
    return other.perspectiveCorrected
      ? { ...known, state: asked ? 'fail' : 'inconclusive', reason: `${seen}: two compounds.` }
      : {
          ...known,
          state: 'inconclusive',
          reason: `${seen}. Mark the plate's corners in both photos, which may bring them together.`,
        };
  }
  const streak = lane.spots[0]?.flags.some((flag) => flag.includes('streak')) ?? false;
  return streak
    ? {
        ...known,
        state: 'inconclusive',
        reason: 'The spot is a streak, which may hide others. Spot less and develop again.',
      }
    : { ...known, state: 'pass', reason: `One spot in lane ${lane.laneLabel}.` };
}

export const tlcClean = criterion({
  name: 'TLC clean',
  schema: z.array(z.enum(ids)).min(1).max(ids.length).describe('visualisers under which one spot may show'),
  evaluate(inputs, visualiserIds) {
    return [...new Set(visualiserIds)].map((id): CriterionResult => {
      const label = findVisualiser(id)?.name ?? id;
      const facts = {
        name: `TLC clean, ${label}`,
        limit: 'one spot',
        uncertainty: null,
        source: 'marked plate photo; one spot is no proof of one compound (common practice)',
      };
      const lanes = inputs.lanes.filter((lane) => lane.visualiserId === id);
      if (lanes.length === 0) {
        const reason = `No marked plate photo under ${label} has a lane of this fraction. Photograph and mark one.`;
        return { ...facts, state: 'missing', measured: null, reason };
      }
      return worstOf(lanes.map((lane) => judgeLane(lane, inputs, facts, visualiserIds)));
    });
  },
});
