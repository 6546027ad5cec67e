import type { Transaction } from 'sequelize';
import { z } from 'zod';
import { type Fraction, RefractiveReading, RunImpurity } from '@/lib/database/records';
import { loadCompoundFacts } from './compound-facts';
import { findSpecificationOf, specificationInput } from './find-specification';
import { gatherLanes } from './gather-lanes';
import { gatherTraces } from './gather-traces';
import type { JudgeInputs, RefractiveInput } from './judge-inputs';

const comparisonSchema = z.object({
  correctedN: z.number(),
  atTemperatureC: z.number(),
  literature: z.object({ n: z.number(), source: z.string() }),
  difference: z.number(),
  expandedUncertainty: z.number(),
});

/** All readings of the fraction, the newest first. */
async function gatherRefractive(fractionId: string, transaction?: Transaction): Promise<RefractiveInput[]> {
  const readings = await RefractiveReading.findAll({
    where: { fractionId },
    order: [
      ['createdAt', 'DESC'],
      ['id', 'DESC'],
    ],
    transaction,
  });
  return readings.map(inputOf);
}

function inputOf(reading: RefractiveReading): RefractiveInput {
  const result = comparisonSchema.safeParse(reading.result);
  return {
    readingId: reading.id,
    wavelengthNm: reading.wavelengthNm,
    waterReading: reading.waterReading,
    waterTemperatureC: reading.waterTemperatureC,
    comparison: result.success
      ? {
          correctedN: result.data.correctedN,
          atTemperatureC: result.data.atTemperatureC,
          literatureN: result.data.literature.n,
          difference: result.data.difference,
          expandedUncertainty: result.data.expandedUncertainty,
          source: result.data.literature.source,
        }
      : null,
  };
}

/** Reads everything that a verdict depends on, inside the caller's transaction where there is one. */
export async function gatherInputs(fraction: Fraction, transaction?: Transaction): Promise<JudgeInputs> {
  const impurities = await RunImpurity.findAll({
    where: { runId: fraction.runId },
    order: [['id', 'ASC']],
    transaction,
  });
  const impurityIds = impurities.map((impurity) => impurity.compoundId);
  const { byId, water } = await loadCompoundFacts([fraction.compoundId, ...impurityIds], transaction);
  const target = byId.get(fraction.compoundId);
  if (!target) throw new Error(`Fraction ${fraction.code} names a compound that does not exist`);
  const specification = await findSpecificationOf(fraction, transaction);
  const [refractive = null, ...earlierRefractive] = await gatherRefractive(fraction.id, transaction);
  return {
    head: {
      fromC: fraction.headTemperatureFromC,
      toC: fraction.headTemperatureToC,
      pressureMbar: fraction.pressureMbar,
    },
    target,
    knownImpurities: impurityIds.flatMap((id) => byId.get(id) ?? []),
    water,
    specification: specification ? specificationInput(specification) : null,
    traces: await gatherTraces(fraction, transaction),
    lanes: await gatherLanes(fraction.id, transaction),
    refractive,
    earlierRefractive,
  };
}
