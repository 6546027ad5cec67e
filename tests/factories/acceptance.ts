import { createHash } from 'node:crypto';
import { recorded } from '@/lib/audit/recorded';
import { systemActor } from '@/lib/auth/actor';
import { newId } from '@/lib/database/ids';
import {
  Compound,
  EvidenceFile,
  type Fraction,
  Integration,
  Peak,
  Run,
  RunImpurity,
  Specification,
  Trace,
  type User,
} from '@/lib/database/records';
import { unique } from '../support/test-server';

type Fields = Record<string, unknown>;

/** An approved specification edition: 99 area % of the target unless said otherwise. */
export async function buildSpecification(
  fields: Fields & { group: { id: string }; compound: Compound; pi: User },
): Promise<Specification> {
  const { group, compound, pi, ...rest } = fields;
  return recorded(systemActor('Test factory'), async ({ transaction, record }) => {
    record({ type: 'laboratory.seeded', recordType: 'laboratory', recordId: 'test' });
    return Specification.create(
      {
        id: newId(),
        groupId: group.id,
        compoundId: compound.id,
        grade: 'working grade',
        edition: 1,
        decisionRule: 'guarded',
        criteria: { gcAreaPercentMin: 99 },
        writtenById: pi.id,
        approvedById: pi.id,
        approvedAt: new Date(),
        ...rest,
      },
      { transaction },
    );
  });
}

/** A trace of the fraction with a first integration: the target's peak and one other (invented areas). */
export async function buildIntegratedTrace(
  fraction: Fraction,
  { purityPercent = 99.6, detector = 'FID' }: { purityPercent?: number; detector?: string } = {},
): Promise<Trace> {
  return recorded(systemActor('Test factory'), async ({ transaction, record }) => {
    record({ type: 'laboratory.seeded', recordType: 'laboratory', recordId: 'test' });
    const evidence = await EvidenceFile.create(
      {
        id: newId(),
        groupId: fraction.groupId,
        runId: fraction.runId,
        fractionId: fraction.id,
        kind: 'gc-trace',
        sha256: createHash('sha256').update(unique('trace')).digest('hex'),
        sizeBytes: 1000,
        mediaType: 'text/csv',
        fileName: 'trace.csv',
        sentByKind: 'user',
        sentById: fraction.collectedById,
        sentByName: 'Test factory',
      },
      { transaction },
    );
    const trace = await Trace.create(
      {
        id: newId(),
        groupId: fraction.groupId,
        runId: fraction.runId,
        fractionId: fraction.id,
        evidenceId: evidence.id,
        subject: 'fraction',
        detector,
        readOptions: {},
        detected: {},
        pointCount: 1000,
        startMin: 0,
        durationMin: 10,
      },
      { transaction },
    );
    const integration = await Integration.create(
      {
        id: newId(),
        traceId: trace.id,
        number: 1,
        methodVersion: 'test',
        parameters: {},
        authorName: 'Test factory',
        noise: 1,
        baseline: [],
        flags: [],
      },
      { transaction },
    );
    const areas = [purityPercent, 100 - purityPercent];
    for (const [at, areaPercent] of areas.entries()) {
      await Peak.create(
        {
          id: newId(),
          integrationId: integration.id,
          number: at + 1,
          retentionTimeMin: 5 + at,
          startMin: 4.8 + at,
          endMin: 5.2 + at,
          area: areaPercent * 10,
          areaPercent,
          height: areaPercent * 100,
          widthHalfMin: 0.08,
          signalToNoise: areaPercent * 100,
          flags: [],
          compoundId: at === 0 ? fraction.compoundId : null,
        },
        { transaction },
      );
    }
    await trace.update({ inForceIntegrationId: integration.id }, { transaction });
    return trace;
  });
}

/** Names a known impurity of a run. */
export async function buildKnownImpurity(run: Run, compound: Compound): Promise<void> {
  await recorded(systemActor('Test factory'), async ({ transaction, record }) => {
    record({ type: 'laboratory.seeded', recordType: 'laboratory', recordId: 'test' });
    await RunImpurity.create({ id: newId(), runId: run.id, compoundId: compound.id }, { transaction });
  });
}

/** Water, which a flame ionisation detector does not see. */
export async function buildWater(): Promise<Compound> {
  return recorded(systemActor('Test factory'), async ({ transaction, record }) => {
    record({ type: 'laboratory.seeded', recordType: 'laboratory', recordId: 'test' });
    const found = await Compound.findOne({ where: { casNumber: '7732-18-5' }, transaction });
    const facts = { name: 'water', casNumber: '7732-18-5', formula: 'H2O', smiles: 'O' };
    return found ?? Compound.create({ id: newId(), ...facts }, { transaction });
  });
}
