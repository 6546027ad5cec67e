import { correctIndex } from '@/lib/evidence/refractive-index/correct-index';
import { smallestVisible } from '@/lib/evidence/refractive-index/smallest-visible';
import type { CompoundFacts, CoverageCell, JudgeInputs } from '../judge-inputs';

/** A difference to look for where no specification names one (METHODS 2; common practice). */
export const USUAL_INDEX_TOLERANCE = 0.0005;

const test = 'refractive index';

/** What the refractive index shows of a compound: the volume per cent that moves it by tolerance and uncertainty. */
export function refractiveCell(compound: CompoundFacts, inputs: JudgeInputs): CoverageCell {
  const done = inputs.refractive !== null && inputs.refractive.comparison !== null;
  const { target } = inputs;
  const answer = (sees: boolean, reason: string, limitPercent?: number): CoverageCell => {
    const limit = limitPercent === undefined ? {} : { limitPercent };
    if (done) return { test, state: sees ? 'sees' : 'blind', ...limit, reason };
    return {
      test,
      state: 'not done',
      wouldSee: sees,
      ...limit,
      reason: `Not done; it would ${sees ? 'see it' : 'not help'}: ${reason}`,
    };
  };
  for (const one of [target, compound]) {
    if (!one.refractiveIndex)
      return answer(false, `No literature value for the refractive index of ${one.name}.`);
  }
  const [a, b] = [target.refractiveIndex!, compound.refractiveIndex!];
  const nImpurity = correctIndex({
    n: b.n,
    temperatureC: b.temperatureC,
    toTemperatureC: a.temperatureC,
    ...(b.fallPerC === null ? {} : { fallPerC: b.fallPerC }),
  });
  const asked = inputs.specification?.criteria.refractiveIndexTolerance ?? USUAL_INDEX_TOLERANCE;
  const tolerance = Math.max(asked, inputs.refractive?.comparison?.expandedUncertainty ?? 0);
  const visible = smallestVisible({ nTarget: a.n, nImpurity, tolerance });
  return answer(visible.state === 'sees', visible.reason, visible.volumePercent ?? undefined);
}
