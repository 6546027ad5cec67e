import { fractionChanged } from '@/lib/acceptance/fraction-changed';
import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { newId } from '@/lib/database/ids';
import { Compound, RefractiveReading, RunImpurity } from '@/lib/database/records';
import { whyNotInState } from '@/lib/distillation/fraction-states';
import { presentCompoundRef } from '@/lib/distillation/present';
import {
  type FractionWithRun,
  requireFraction,
  requireFractionForChange,
} from '@/lib/distillation/require-fraction';
import { Problem } from '@/lib/errors';
import { compareReadings, type ImpurityIndex } from './compare-readings';
import { INDEX_METHOD_VERSION } from './correct-index';
import { findIndexFall, findLiteratureIndex } from './find-index';
import { findTolerance } from './find-tolerance';
import { presentRefractiveReading } from './present';
import type { NewRefractiveReading, RefractiveReadingJson } from './schema';

/**
 * Stores refractometer readings of a fraction with what they say. Nothing is ever changed: a second look is a second
 * reading. 404, 403 and 409 as for any change of the fraction; without a literature value the readings are kept as
 * inconclusive and the answer says what to add.
 */
export async function addRefractiveReading(
  actor: Actor,
  fractionCode: string,
  given: NewRefractiveReading,
): Promise<RefractiveReadingJson> {
  const known = await requireFraction(actor, fractionCode);
  authorise(actor, 'refractiveIndex.write', known.groupId);
  const { state, result } = compareReadings({
    given,
    targetName: known.compound.name,
    literature: await findLiteratureIndex(known.compoundId),
    fall: await findIndexFall(known.compoundId),
    tolerance: await findTolerance(known),
    impurities: await impurityIndices(known),
  });
  return recorded(actor, async (recorder) => {
    const { transaction, record } = recorder;
    const fraction = await requireFractionForChange(actor, fractionCode, transaction);
    const reason = whyNotInState('change', fraction.status);
    if (reason) throw new Problem('state-conflict', reason);
    const row = await RefractiveReading.create(
      {
        id: newId(),
        fractionId: fraction.id,
        readings: given.readings,
        temperatureC: given.temperatureC,
        wavelengthNm: given.wavelengthNm,
        waterReading: given.waterReading ?? null,
        waterTemperatureC:
          given.waterReading == null ? null : (given.waterTemperatureC ?? given.temperatureC),
        instrument: given.instrument ?? null,
        result,
        state,
        methodVersion: INDEX_METHOD_VERSION,
        readById: actor.kind === 'user' ? actor.userId : null,
        readByName: actor.name,
      },
      { transaction },
    );
    const after = presentRefractiveReading(row, fraction.code);
    record({
      type: 'refractive_index.read',
      recordType: 'refractive reading',
      recordId: row.id,
      groupId: fraction.groupId,
      after,
    });
    await fractionChanged(recorder, fraction, 'refractive index read');
    return after;
  });
}

async function impurityIndices(fraction: FractionWithRun): Promise<ImpurityIndex[]> {
  const known = await RunImpurity.findAll({ where: { runId: fraction.runId }, order: [['id', 'ASC']] });
  const compounds = await Compound.findAll({ where: { id: known.map((row) => row.compoundId) } });
  return Promise.all(
    compounds
      .sort((a, b) => a.name.localeCompare(b.name))
      .map(async (compound) => ({
        compound: presentCompoundRef(compound),
        literature: await findLiteratureIndex(compound.id),
        fall: await findIndexFall(compound.id),
      })),
  );
}
