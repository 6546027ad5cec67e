import type { Transaction } from 'sequelize';
import { digestOf } from '@/lib/acceptance/digest';
import { type Fraction, RefractiveReading, Run, RunImpurity, Trace, Verdict } from '@/lib/database/records';
import { findIntegrationsInForce } from '@/lib/evidence/gc/find-integrations-in-force';
import { listFractionEvidence } from './list-fraction-evidence';
import { listFractionPlates } from './list-fraction-plates';

/** Which facts of a signature are under its own digest. */
export type SignedAs = {
  code: string;
  signerId: string;
  signerName: string;
  role: string;
  meaning: string;
  comment: string | null;
  signedAt: string;
};

async function integrationsOf(fractionId: string, transaction?: Transaction) {
  const traces = await Trace.findAll({ where: { fractionId }, order: [['id', 'ASC']], transaction });
  const inForce = await findIntegrationsInForce(traces, transaction);
  return traces.map((trace) => {
    const { integration, peaks = [] } = inForce.get(trace.id) ?? {};
    return {
      traceId: trace.id,
      evidenceId: trace.evidenceId,
      detector: trace.detector,
      integrationId: integration?.id ?? null,
      number: integration?.number ?? null,
      methodVersion: integration?.methodVersion ?? null,
      parameters: integration?.parameters ?? null,
      peaks: peaks.map(({ number, retentionTimeMin, area, areaPercent, compoundId }) => ({
        number,
        retentionTimeMin,
        area,
        areaPercent,
        compoundId,
      })),
    };
  });
}

async function readingsOf(fractionId: string, transaction?: Transaction) {
  const readings = await RefractiveReading.findAll({
    where: { fractionId },
    order: [['id', 'ASC']],
    transaction,
  });
  return readings.map((reading) => ({
    id: reading.id,
    readings: reading.readings,
    temperatureC: reading.temperatureC,
    wavelengthNm: reading.wavelengthNm,
    resultDigest: digestOf(reading.result),
  }));
}

async function runOf(fraction: Fraction, transaction?: Transaction) {
  const run = await Run.findByPk(fraction.runId, { transaction });
  const impurities = await RunImpurity.findAll({
    where: { runId: fraction.runId },
    order: [['compoundId', 'ASC']],
    transaction,
  });
  return {
    code: run?.code ?? null,
    targetCompoundId: run?.targetCompoundId ?? null,
    knownImpurityIds: impurities.map((impurity) => impurity.compoundId),
  };
}

/**
 * What a signature signs, read from the present records: the fraction, its verdict, the digests of the original
 * bytes, and what was read from them. Not in it: status and version, which the signature itself changes.
 */
export async function buildManifest(fraction: Fraction, signedAs: SignedAs, transaction?: Transaction) {
  const verdict = fraction.verdictId ? await Verdict.findByPk(fraction.verdictId, { transaction }) : null;
  const evidence = await listFractionEvidence(fraction.id, transaction);
  return {
    format: 'heartcut-manifest-1',
    signature: signedAs,
    fraction: {
      id: fraction.id,
      code: fraction.code,
      compoundId: fraction.compoundId,
      cut: fraction.cut,
      collectedById: fraction.collectedById,
      collectedAt: fraction.collectedAt.toISOString(),
      headTemperatureFromC: fraction.headTemperatureFromC,
      headTemperatureToC: fraction.headTemperatureToC,
      pressureMbar: fraction.pressureMbar,
      tareMassG: fraction.tareMassG,
      grossMassG: fraction.grossMassG,
      appearance: fraction.appearance,
    },
    run: await runOf(fraction, transaction),
    verdict: verdict && {
      id: verdict.id,
      state: verdict.state,
      contentDigest: verdict.contentDigest,
      engineVersion: verdict.engineVersion,
      specificationId: verdict.specificationId,
    },
    evidence: evidence.map(({ id, kind, sha256, sizeBytes, mediaType, fileName }) => ({
      id,
      kind,
      sha256,
      sizeBytes: Number(sizeBytes),
      mediaType,
      fileName,
    })),
    traces: await integrationsOf(fraction.id, transaction),
    plates: (await listFractionPlates(fraction.id, transaction)).map((plate) => ({
      id: plate.id,
      stationaryPhase: plate.stationaryPhase,
      eluent: plate.eluent,
      photos: plate.photos.map(({ id, evidenceId, visualiser }) => ({ id, evidenceId, visualiser })),
      lanes: plate.lanes.map((lane) => ({
        label: lane.label,
        spots: lane.spots.map(({ photoId, position, rf, rfUncertainty }) => ({
          photoId,
          position,
          rf,
          rfUncertainty,
        })),
      })),
    })),
    refractiveReadings: await readingsOf(fraction.id, transaction),
  };
}
