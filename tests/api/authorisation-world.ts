import { recorded } from '@/lib/audit/recorded';
import { systemActor } from '@/lib/auth/actor';
import { newId } from '@/lib/database/ids';
import { EvidenceFile, LiteratureValue, Specification, TrayItem } from '@/lib/database/records';
import type { Compound, Fraction, Group, Run } from '@/lib/database/records';
import sharp from 'sharp';
import {
  buildEthylAcetate,
  buildFraction,
  buildGroup,
  buildRun,
  buildToken,
  buildUser,
  type BuiltUser,
} from '../factories/records';
import { type Agent, anonymous, sha256, signedIn, unique, withToken } from '../support/test-server';
import type { Caller } from './authorisation-matrix';

/** One group with a record of each kind, and one caller of each kind. */
export type World = {
  agents: Record<Caller, Agent>;
  people: Record<'chemist' | 'analyst' | 'pi', BuiltUser>;
  password: string;
  group: Group;
  compound: Compound;
  run: Run;
  fraction: Fraction;
  instrumentId: string;
  literatureId: string;
  specificationId: string;
  photoId: string;
  plateBody: Record<string, unknown>;
  plateId: string;
  traceId: string;
  integrationId: string;
  word: () => string;
  anotherToken: () => Promise<string>;
  freshFraction: (fields?: Record<string, unknown>) => Promise<string>;
  freshTraceFile: () => Promise<Record<string, unknown>>;
  freshTrayItem: () => Promise<string>;
};

/** Two well-parted peaks as CSV; `salt` makes the bytes differ. */
function traceCsv(salt: string): Buffer {
  const lines = [`# ${salt}`, 'time_min,signal'];
  for (let i = 0; i <= 1200; i++) {
    const t = i / 200;
    const peak = (at: number, height: number) => height * Math.exp(-((t - at) ** 2) / (2 * 0.03 ** 2));
    lines.push(`${t.toFixed(4)},${(peak(2, 1000) + peak(4, 20) + Math.sin(i * 12.9898) * 0.05).toFixed(5)}`);
  }
  return Buffer.from(lines.join('\n') + '\n');
}

async function upload(
  agent: Agent,
  query: string,
  type: string,
  name: string,
  bytes: Buffer,
): Promise<string> {
  const { body } = await agent
    .post(`/api/v1/evidence?${query}`)
    .set('Content-Type', type)
    .set('X-Filename', name)
    .send(bytes)
    .expect(201);
  return body.evidence.id as string;
}

async function buildAgents(group: Group) {
  const other = await buildGroup();
  const people = {
    chemist: await buildUser({ group, roles: ['chemist'] }),
    analyst: await buildUser({ group, roles: ['analyst'] }),
    pi: await buildUser({ group, roles: ['pi'] }),
  };
  const admin = await buildUser({ isAdmin: true });
  const foreign = await buildUser({ group: other, roles: ['chemist', 'analyst', 'pi'] });
  const { token, instrument } = await buildToken({ group });
  const revoked = await buildToken({ group, revokedAt: new Date() });
  const enter = (user: BuiltUser) => signedIn({ email: user.email, password: user.plainPassword });
  const agents: Record<Caller, Agent> = {
    nobody: await anonymous(),
    chemist: await enter(people.chemist),
    analyst: await enter(people.analyst),
    pi: await enter(people.pi),
    admin: await enter(admin),
    foreign: await enter(foreign),
    token: await withToken(token),
    revoked: await withToken(revoked.token),
  };
  return { agents, people, instrumentId: instrument.id };
}

async function writeShared(group: Group, compound: Compound, pi: BuiltUser) {
  return recorded(systemActor('Test factory'), async ({ transaction, record }) => {
    record({ type: 'specification.written', recordType: 'specification', recordId: 'test' });
    const literature = await LiteratureValue.create(
      {
        id: newId(),
        compoundId: compound.id,
        property: 'density',
        value: 0.9,
        unit: 'g/mL',
        temperatureC: 20,
        source: 'a test (invented)',
      },
      { transaction },
    );
    const specification = await Specification.create(
      {
        id: newId(),
        groupId: group.id,
        compoundId: compound.id,
        grade: unique('grade'),
        edition: 1,
        decisionRule: 'simple',
        criteria: { refractiveIndexTolerance: 0.0005 },
        writtenById: pi.id,
      },
      { transaction },
    );
    return { literatureId: literature.id, specificationId: specification.id };
  });
}

/** Files a waiting file into the tray, as if an instrument PC had sent it for a fraction nobody knows. */
async function buildTrayItem(group: Group, instrumentId: string): Promise<string> {
  return recorded(systemActor('Test factory'), async ({ transaction, record }) => {
    record({ type: 'tray.received', recordType: 'tray', recordId: 'test', groupId: group.id });
    const evidence = await EvidenceFile.create(
      {
        id: newId(),
        groupId: group.id,
        kind: 'document',
        sha256: sha256(unique('bytes')),
        sizeBytes: 10,
        mediaType: 'text/plain',
        fileName: 'note.txt',
        sentByKind: 'token',
        sentById: newId(),
        sentByName: 'GC',
      },
      { transaction },
    );
    const item = await TrayItem.create(
      {
        id: newId(),
        groupId: group.id,
        evidenceId: evidence.id,
        instrumentId,
        askedFor: 'D-1999-0001-F1',
        reason: 'There is no such fraction.',
      },
      { transaction },
    );
    return item.id;
  });
}

export async function buildWorld(): Promise<World> {
  const group = await buildGroup();
  const compound = await buildEthylAcetate();
  const { agents, people, instrumentId } = await buildAgents(group);
  const run = await buildRun({ group, chemist: people.chemist, target: compound });
  const fraction = await buildFraction({ run });
  const photo = await sharp({ create: { width: 400, height: 800, channels: 3, background: '#7fbf7f' } })
    .jpeg()
    .withExifMerge({ IFD0: { ImageDescription: unique('photo') } })
    .toBuffer();
  const photoId = await upload(
    agents.chemist,
    `run=${run.code}&kind=plate-photo`,
    'image/jpeg',
    'plate.jpg',
    photo,
  );
  const plateBody = {
    evidenceId: photoId,
    stationaryPhase: 'silica gel 60 F254',
    eluent: 'hexane / ethyl acetate 4:1',
    visualiser: 'uv-254',
    units: 'px',
    baseline: [{ x: 0, y: 700 }],
    front: [{ x: 0, y: 100 }],
    lanes: [{ label: '1', subject: { kind: 'fraction', code: fraction.code }, spots: [{ x: 200, y: 400 }] }],
  };
  const plate = await agents.chemist.post(`/api/v1/runs/${run.code}/plates`).send(plateBody).expect(201);
  const freshFraction = async (fields = {}) => (await buildFraction({ run, ...fields })).code;
  const freshTraceFile = async () => {
    const code = await freshFraction();
    const evidenceId = await upload(
      agents.analyst,
      `run=${run.code}&kind=document`,
      'text/csv',
      'trace.csv',
      traceCsv(unique('salt')),
    );
    return { evidenceId, fraction: code, subject: 'fraction', detector: 'FID' };
  };
  const trace = await agents.analyst
    .post('/api/v1/traces')
    .send(await freshTraceFile())
    .expect(201);
  return {
    agents,
    people,
    password: people.chemist.plainPassword,
    group,
    compound,
    run,
    fraction,
    instrumentId,
    ...(await writeShared(group, compound, people.pi)),
    photoId,
    plateBody,
    plateId: plate.body.id,
    traceId: trace.body.id,
    integrationId: trace.body.integration.id,
    word: () => unique('word'),
    anotherToken: async () => (await buildToken({ group })).row.id,
    freshFraction,
    freshTraceFile,
    freshTrayItem: () => buildTrayItem(group, instrumentId),
  };
}
