import type { CompoundRef } from '@/lib/distillation/quantities';
import { correctIndex, isSodiumD } from './correct-index';
import { decideDifference, type DecisionRule } from './decide';
import type { IndexFall, LiteratureIndex } from './find-index';
import type { NewRefractiveReading, RefractiveResult } from './schema';
import { smallestVisible } from './smallest-visible';
import { indexBudget, replicateStatistics } from './uncertainty';
import { checkWater } from './water-check';

/** A known impurity with its own literature index, where one is kept. */
export type ImpurityIndex = { compound: CompoundRef; literature: LiteratureIndex | null; fall: IndexFall };

export type Tolerance = { tolerance: number; rule: DecisionRule; source: string };

export type ComparisonInput = {
  given: NewRefractiveReading;
  targetName: string;
  literature: LiteratureIndex | null;
  fall: IndexFall;
  tolerance: Tolerance;
  impurities: readonly ImpurityIndex[];
};

type State = 'pass' | 'fail' | 'inconclusive';

/**
 * Everything that readings of one sample say: mean, correction to the temperature of the literature value, difference
 * with its uncertainty, the decision, and what the test could see. Wrong light, a bad water check and a missing
 * literature value make it inconclusive; the readings are kept in any case.
 */
export function compareReadings(input: ComparisonInput): { state: State; result: RefractiveResult } {
  const { given, literature, fall, tolerance } = input;
  const statistics = replicateStatistics(given.readings);
  const waterCheck = waterCheckOf(given);
  const base = {
    meanN: statistics.meanN,
    standardDeviation: statistics.standardDeviation,
    coverageFactor: 2 as const,
    fallPerC: fall.fallPerC,
    fallSource: fall.source,
    tolerance: tolerance.tolerance,
    decisionRule: tolerance.rule,
    toleranceSource: tolerance.source,
    waterCheck,
    notes: waterCheck ? [] : ['The instrument was not checked with water: read pure water as well.'],
  };
  if (!literature) {
    const reason = `No refractive index of ${input.targetName} at the sodium D line is kept, so there is nothing to compare with. A PI can add one with its source to the compound; then enter the readings again.`;
    return {
      state: 'inconclusive',
      result: {
        ...base,
        correctedN: null,
        atTemperatureC: null,
        literature: null,
        difference: null,
        expandedUncertainty: null,
        reason,
        budget: [],
        smallestVisible: input.impurities.map(({ compound }) => ({
          compound,
          state: 'unknown' as const,
          volumePercent: null,
          reason: `No literature index of ${input.targetName}.`,
        })),
      },
    };
  }
  const correctedN = correctIndex({
    n: statistics.meanN,
    temperatureC: given.temperatureC,
    toTemperatureC: literature.temperatureC,
    fallPerC: fall.fallPerC,
  });
  const budget = indexBudget({
    readings: given.readings,
    temperatureC: given.temperatureC,
    literatureTemperatureC: literature.temperatureC,
    resolution: given.resolution,
    temperatureUncertaintyC: given.temperatureUncertaintyC,
    fallPerC: fall.fallPerC,
    ...(fall.uncertaintyPerC === null ? {} : { fallUncertaintyPerC: fall.uncertaintyPerC }),
    ...(literature.halfWidth === null ? {} : { literatureHalfWidth: literature.halfWidth }),
  });
  const difference = correctedN - literature.n;
  const { expandedUncertainty } = budget;
  const decision =
    hindranceOf(given, waterCheck) ??
    decideDifference({
      difference,
      expandedUncertainty,
      tolerance: tolerance.tolerance,
      rule: tolerance.rule,
    });
  return {
    state: decision.state,
    result: {
      ...base,
      correctedN,
      atTemperatureC: literature.temperatureC,
      literature: {
        n: literature.n,
        temperatureC: literature.temperatureC,
        source: literature.source,
        valueId: literature.valueId,
      },
      difference,
      expandedUncertainty,
      reason: decision.reason,
      budget: budget.rows,
      notes: [...base.notes, ...budget.notes],
      smallestVisible: input.impurities.map((impurity) =>
        visibleOf(impurity, literature, tolerance.tolerance),
      ),
    },
  };
}

function waterCheckOf(given: NewRefractiveReading): RefractiveResult['waterCheck'] {
  if (given.waterReading == null) return null;
  return checkWater({
    reading: given.waterReading,
    temperatureC: given.waterTemperatureC ?? given.temperatureC,
  });
}

function hindranceOf(
  given: NewRefractiveReading,
  waterCheck: RefractiveResult['waterCheck'],
): { state: 'inconclusive'; reason: string } | null {
  if (!isSodiumD(given.wavelengthNm)) {
    const reason = `Read at ${given.wavelengthNm} nm: only the sodium D line can be compared. Read again at 589.3 nm.`;
    return { state: 'inconclusive', reason };
  }
  return waterCheck?.state === 'inconclusive' ? { state: 'inconclusive', reason: waterCheck.reason } : null;
}

/** Both indices are compared at the temperature of the target's literature value. */
function visibleOf(
  { compound, literature, fall }: ImpurityIndex,
  target: LiteratureIndex,
  tolerance: number,
): RefractiveResult['smallestVisible'][number] {
  if (!literature) {
    const reason = `No refractive index of ${compound.name} is kept: what the test shows of it is not known.`;
    return { compound, state: 'unknown', volumePercent: null, reason };
  }
  const nImpurity = correctIndex({
    n: literature.n,
    temperatureC: literature.temperatureC,
    toTemperatureC: target.temperatureC,
    fallPerC: fall.fallPerC,
  });
  return { compound, ...smallestVisible({ nTarget: target.n, nImpurity, tolerance }) };
}
