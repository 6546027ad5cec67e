import { cleanPercent } from '@/lib/acceptance/clean-percent';
import type { Compound, LogReading, Run } from '@/models';
import type { FractionJson } from './fraction-schema';
import type { CompoundRef } from './quantities';
import type { ReadingJson } from './reading-schema';
import type { FractionWithRun } from './require-fraction';
import type { RunWithPeople } from './require-run';
import type { RunJson } from './schema';

/** A compound as it is named inside other records. */
export function presentCompoundRef(compound: Pick<Compound, 'id' | 'name' | 'casNumber'>): CompoundRef {
  return { id: compound.id, name: compound.name, cas: compound.casNumber ?? null };
}

/** A run with its people and compounds as JSON. */
export function presentRun(run: RunWithPeople): RunJson {
  return {
    id: run.id,
    code: run.code,
    version: run.version,
    group: { id: run.group.id, name: run.group.name },
    chemist: { id: run.chemist.id, name: run.chemist.name },
    targetCompound: presentCompoundRef(run.target),
    knownImpurities: [...run.impurities].sort((a, b) => a.name.localeCompare(b.name)).map(presentCompoundRef),
    ...presentRunFacts(run),
  };
}

function presentRunFacts(run: Run) {
  return {
    technique: run.technique,
    chargeMassG: run.chargeMassG,
    chargeSource: run.chargeSource,
    chargeLot: run.chargeLot ?? null,
    columnStages: run.columnStages ?? null,
    bath: run.bath ?? null,
    bathTemperatureC: run.bathTemperatureC ?? null,
    plannedPressureMbar: run.plannedPressureMbar ?? null,
    safetyChecks: run.safetyChecks,
    residueMassG: run.residueMassG ?? null,
    note: run.note ?? null,
    startedAt: run.startedAt.toISOString(),
    endedAt: run.endedAt?.toISOString() ?? null,
  };
}

/** The facts of a fraction without its evidence. */
export function presentFraction(fraction: FractionWithRun): FractionJson {
  return {
    id: fraction.id,
    code: fraction.code,
    version: fraction.version,
    run: fraction.run.code,
    number: fraction.number,
    compound: presentCompoundRef(fraction.compound),
    cut: fraction.cut,
    headTemperatureFromC: fraction.headTemperatureFromC ?? null,
    headTemperatureToC: fraction.headTemperatureToC ?? null,
    pressureMbar: fraction.pressureMbar ?? null,
    tareMassG: fraction.tareMassG ?? null,
    grossMassG: fraction.grossMassG ?? null,
    netMassG: fraction.netMassG ?? null,
    appearance: fraction.appearance ?? null,
    storagePlace: fraction.storagePlace ?? null,
    status: fraction.status,
    verdict: fraction.verdictState,
    purityPercent: fraction.purityPercent == null ? null : cleanPercent(fraction.purityPercent),
    collectedAt: fraction.collectedAt.toISOString(),
    collectedBy: { id: fraction.collectedBy.id, name: fraction.collectedBy.name },
  };
}

export function presentReading(reading: LogReading): ReadingJson {
  return {
    id: reading.id,
    at: reading.at.toISOString(),
    headTemperatureC: reading.headTemperatureC ?? null,
    bathTemperatureC: reading.bathTemperatureC ?? null,
    pressureMbar: reading.pressureMbar ?? null,
    volumeMl: reading.volumeMl ?? null,
    note: reading.note ?? null,
    sentBy: reading.sentByKind,
  };
}
