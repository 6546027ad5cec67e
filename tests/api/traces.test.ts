import { existsSync, readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Fraction, type Group, type Run } from '@/lib/database/records';
import { buildEmgTrace } from '../factories/emg-trace';
import {
  buildCompound,
  buildFraction,
  buildGroup,
  buildRun,
  buildToken,
  buildUser,
} from '../factories/records';
import { writeTraceCsv } from '../factories/trace-csv';
import { type Agent, signedIn, stopTestServer, unique, withToken } from '../support/test-server';

type PeakJson = { number: number; retentionTimeMin: number; areaPercent: number; compound: unknown };

// Exact areas: exponentially modified Gaussians, 96 + 3 + 1 in signal x min, with drift and noise on an offset.
const truth = [
  { atMin: 3.2, sigmaMin: 0.02, tauMin: 0.01, areaUnits: 3 },
  { atMin: 5.1, sigmaMin: 0.03, tauMin: 0.015, areaUnits: 96 },
  { atMin: 7.4, sigmaMin: 0.035, tauMin: 0.01, areaUnits: 1 },
];
const makeTrace = (seed = 1) =>
  buildEmgTrace({
    peaks: truth,
    durationMin: 12,
    pointCount: 12_001,
    offset: 20,
    driftPerMin: 0.05,
    noise: 0.01,
    seed,
  });
let seed = 0;
/** New bytes each time: equal files of one fraction are one file. */
const freshCsv = (options = {}) => writeTraceCsv(makeTrace((seed += 1) + (Date.now() % 1e9)), options);

let group: Group;
let chemist: Agent;
let analyst: Agent;
let run: Run;
const sessionFor = async (roles: ('chemist' | 'analyst' | 'pi')[], inGroup = group) => {
  const user = await buildUser({ group: inGroup, roles });
  return signedIn({ email: user.email, password: user.plainPassword });
};
async function upload(agent: Agent, query: string, bytes: Buffer, name = 'trace.csv') {
  const { body } = await agent
    .post(`/api/v1/evidence?${query}`)
    .set('Content-Type', 'text/csv')
    .set('X-Filename', name)
    .send(bytes);
  return body;
}
const freshFraction = () => buildFraction({ run });
/** A file stored for the run, which nobody has read yet. */
async function storedForRun(bytes: Buffer, name?: string): Promise<string> {
  return (await upload(analyst, `run=${run.code}&kind=gc-trace`, bytes, name)).evidence.id;
}
async function readTrace(bytes = freshCsv(), extra: object = {}) {
  const fraction = await freshFraction();
  const evidenceId = await storedForRun(bytes);
  const { body } = await analyst
    .post('/api/v1/traces')
    .send({ evidenceId, fraction: fraction.code, subject: 'fraction', detector: 'FID', ...extra })
    .expect(201);
  return { body, fraction, evidenceId };
}
function expectTruth(peaks: PeakJson[]) {
  expect(peaks).toHaveLength(3);
  truth.forEach((peak, at) => {
    // Within 0.1 % of the true area: areas sum to 100, so area % is the area.
    expect(Math.abs(peaks[at]!.areaPercent / peak.areaUnits - 1)).toBeLessThan(
      peak.areaUnits > 50 ? 0.001 : 0.02,
    );
    expect(Math.abs(peaks[at]!.areaPercent - peak.areaUnits)).toBeLessThan(0.1);
    expect(Math.abs(peaks[at]!.retentionTimeMin - peak.atMin)).toBeLessThan(0.03);
  });
}

beforeAll(async () => {
  group = await buildGroup();
  chemist = await sessionFor(['chemist']);
  analyst = await sessionFor(['analyst']);
  run = await buildRun({ group });
});
afterAll(stopTestServer);

describe('reading a trace', () => {
  it('gives area per cent of exactly known peaks within 0.1 %, and the purity of the fraction', async () => {
    const { body, fraction } = await readTrace();
    expect(body).toMatchObject({
      fraction: fraction.code,
      run: run.code,
      subject: 'fraction',
      detector: 'FID',
      detectorAssumed: false,
      confirmed: true,
      pointCount: 12_001,
      detected: { delimiter: ',', decimal: '.', timeUnit: 'min', timeUnitFrom: 'heading' },
    });
    expect(body.durationMin).toBeCloseTo(12, 6);
    expect(body.integration).toMatchObject({ version: 1, inForce: true, reason: null });
    expectTruth(body.integration.peaks);
    const after = await Fraction.findByPk(fraction.id);
    // Nobody has assigned a peak: the largest is taken for the target.
    expect(Math.abs(after!.purityPercent! - 96)).toBeLessThan(0.1);
  });

  it('reads decimal commas, semicolons and seconds to the same figures', async () => {
    const { body } = await readTrace(freshCsv({ delimiter: ';', decimal: ',', timeUnit: 's' }));
    expect(body.detected).toMatchObject({ delimiter: ';', decimal: ',', timeUnit: 's' });
    expect(body.durationMin).toBeCloseTo(12, 6);
    expectTruth(body.integration.peaks);
  });

  it('takes what a person says over what it would detect', async () => {
    const bytes = freshCsv({ heading: false, timeUnit: 's' });
    const { body } = await readTrace(bytes, { read: { timeUnit: 's', timeColumn: 0, signalColumn: 1 } });
    expect(body.detected).toMatchObject({ timeUnit: 's', timeUnitFrom: 'given' });
    expect(body.read).toEqual({ timeUnit: 's', timeColumn: 0, signalColumn: 1 });
    expectTruth(body.integration.peaks);
  });

  it('says which line of a file it cannot read, and keeps the file', async () => {
    const lines = freshCsv().toString().split('\n');
    lines[500] = 'pump off;;';
    const evidenceId = await storedForRun(Buffer.from(lines.join('\n')));
    const fraction = await freshFraction();
    const { body } = await analyst
      .post('/api/v1/traces')
      .send({ evidenceId, fraction: fraction.code, subject: 'fraction' })
      .expect(422);
    expect(body.detail).toMatch(/501/);
    expect(body.errors[0].path).toBe('evidenceId');
    await analyst.get(`/api/v1/evidence/${evidenceId}`).expect(200);
  });

  it('answers 200 with the same trace when it was read just so already, and takes a correction', async () => {
    const { body, fraction, evidenceId } = await readTrace();
    const again = { evidenceId, fraction: fraction.code, subject: 'fraction', detector: 'FID' };
    const same = await analyst.post('/api/v1/traces').send(again).expect(200);
    expect(same.body.id).toBe(body.id);
    const other = await analyst
      .post('/api/v1/traces')
      .send({ ...again, detector: 'TCD' })
      .expect(201);
    expect(other.body).toMatchObject({ id: body.id, detector: 'TCD', integration: { version: 1 } });
    const seconds = await analyst
      .post('/api/v1/traces')
      .send({ ...again, read: { timeUnit: 's' } })
      .expect(201);
    expect(seconds.body).toMatchObject({ id: body.id, integration: { version: 2 } });
    expect(seconds.body.durationMin).toBeCloseTo(0.2, 6);
  });

  it('belongs to the run for the crude, and shows in the lists', async () => {
    const evidenceId = await storedForRun(freshCsv());
    const { body } = await analyst
      .post('/api/v1/traces')
      .send({ evidenceId, run: run.code, subject: 'crude', detector: 'FID' })
      .expect(201);
    expect(body).toMatchObject({ fraction: null, run: run.code, subject: 'crude' });
    const list = await analyst.get(`/api/v1/traces?run=${run.code}&limit=1`).expect(200);
    expect(list.body.items[0].id).toBe(body.id);
    expect(list.body.nextCursor).not.toBeNull();
    const next = await analyst.get(`/api/v1/traces?run=${run.code}&limit=1&cursor=${list.body.nextCursor}`);
    expect(next.body.items[0].id).not.toBe(body.id);
    const none = await analyst.get('/api/v1/traces?run=no-such-run').expect(200);
    expect(none.body).toEqual({ items: [], nextCursor: null });
  });

  it('says that the reader of JCAMP-DX comes later, and what to do now', async () => {
    const jcamp = Buffer.from(
      `##TITLE=${unique('x')}\n##JCAMP-DX=4.24\n##XYDATA=(X++(Y..Y))\n0 1 2 3\n##END=\n`,
    );
    const evidenceId = await storedForRun(jcamp, 'trace.jdx');
    const fraction = await freshFraction();
    const { body } = await analyst
      .post('/api/v1/traces')
      .send({ evidenceId, fraction: fraction.code, subject: 'fraction' })
      .expect(422);
    expect(body.detail).toMatch(/JCAMP-DX.*later.*CSV/);
  });
});

describe('a file that comes for a fraction', () => {
  it('by an instrument is read at once; an analyst confirms it and the integration stays', async () => {
    const fraction = await freshFraction();
    const agent = await withToken((await buildToken({ group })).token);
    const stored = await upload(agent, `fraction=${fraction.code}`, freshCsv(), 'heart_cut_TCD_01.csv');
    const list = await analyst.get(`/api/v1/traces?fraction=${fraction.code}`).expect(200);
    expect(list.body.items).toHaveLength(1);
    const [row] = list.body.items;
    expect(row).toMatchObject({ confirmed: false, detector: 'TCD', detectorAssumed: false });
    const confirmed = await analyst
      .post('/api/v1/traces')
      .send({ evidenceId: stored.evidence.id, fraction: fraction.code, subject: 'fraction' })
      .expect(201);
    expect(confirmed.body).toMatchObject({ id: row.id, confirmed: true });
    expect(confirmed.body.integration).toMatchObject({ version: 1, author: 'Heartcut, on arrival' });
    expectTruth(confirmed.body.integration.peaks);
  });

  it('and cannot be read is kept, and the answer says why', async () => {
    const fraction = await freshFraction();
    const rows = Array.from({ length: 50 }, (_, i) => `${i + 1},${(i % 7) + seed / 1000}`).join('\n');
    const stored = await upload(chemist, `fraction=${fraction.code}&kind=gc-trace`, Buffer.from(rows));
    expect(stored.evidence.id).toBeTruthy();
    expect(stored.notes.join(' ')).toMatch(/sampling rate/);
    const list = await analyst.get(`/api/v1/traces?fraction=${fraction.code}`).expect(200);
    expect(list.body.items).toEqual([]);
  });
});

describe('a look at how a file would be read', () => {
  it('tells what was detected and saves nothing', async () => {
    const evidenceId = await storedForRun(freshCsv({ delimiter: '\t' }), 'fid-run.tsv');
    const { body } = await analyst.post(`/api/v1/evidence/${evidenceId}/trace-preview`).send({}).expect(200);
    expect(body).toMatchObject({
      detected: { delimiter: 'tab', columns: ['Time (min)', 'Signal (pA)'] },
      detector: 'FID',
      pointCount: 12_001,
      peakCount: 3,
    });
    const list = await analyst.get(`/api/v1/traces?run=${run.code}&limit=200`).expect(200);
    expect(list.body.items.some((row: { evidence: { id: string } }) => row.evidence.id === evidenceId)).toBe(
      false,
    );
  });
});

describe('points for a picture', () => {
  it('are thinned, and every extreme stays', async () => {
    const trace = makeTrace(77);
    const { body } = await readTrace(writeTraceCsv(trace));
    const { body: points } = await analyst.get(`/api/v1/traces/${body.id}/points?pixels=300`).expect(200);
    expect(points).toMatchObject({ pointCount: 12_001, thinned: true });
    expect(points.timeMin.length).toBeLessThanOrEqual(602);
    expect(points.timeMin).toHaveLength(points.signal.length);
    expect(Math.max(...points.signal)).toBe(Math.max(...trace.signal));
    expect(Math.min(...points.signal)).toBe(Math.min(...trace.signal));
  });

  it('of a range are those of the range, whole where they fit', async () => {
    const { body } = await readTrace();
    const { body: points } = await analyst
      .get(`/api/v1/traces/${body.id}/points?from=5&to=5.2&pixels=1000`)
      .expect(200);
    expect(points.thinned).toBe(false);
    expect(points.timeMin[0]).toBeGreaterThanOrEqual(5);
    expect(points.timeMin.at(-1)).toBeLessThanOrEqual(5.2);
    expect(points.timeMin.length).toBeGreaterThan(190);
    await analyst.get(`/api/v1/traces/${body.id}/points?from=5&to=4`).expect(400);
    await analyst.get(`/api/v1/traces/${body.id}/points?zoom=5`).expect(400);
  });
});

describe('integrating anew', () => {
  it('adds a version with its reason and puts it in force; the old one stays as it was', async () => {
    const { body: trace, fraction } = await readTrace();
    const path = `/api/v1/traces/${trace.id}/integrations`;
    const { body } = await analyst
      .post(path)
      .send({
        reason: 'The first peak is the solvent of the rinse',
        parameters: { exclude: [{ fromMin: 3, toMin: 3.5, reason: 'solvent' }] },
      })
      .expect(201);
    expect(body).toMatchObject({
      version: 2,
      inForce: true,
      reason: 'The first peak is the solvent of the rinse',
    });
    expect(body.peaks).toHaveLength(2);
    expect(Math.abs(body.peaks[0].areaPercent - (100 * 96) / 97)).toBeLessThan(0.1);
    expect(body.excludedPeaks).toMatchObject([{ reason: 'solvent' }]);
    const { body: old } = await analyst.get(`/api/v1/integrations/${trace.integration.id}`).expect(200);
    expect(old).toEqual({ ...trace.integration, inForce: false });
    const { body: list } = await analyst.get(path).expect(200);
    expect(list.items.map((row: { version: number }) => row.version)).toEqual([2, 1]);
    const after = await Fraction.findByPk(fraction.id);
    expect(Math.abs(after!.purityPercent! - (100 * 96) / 97)).toBeLessThan(0.1);
  });

  it('assigns a peak to a compound, keeps it over the next version, and takes it away', async () => {
    const { body: trace } = await readTrace();
    const path = `/api/v1/traces/${trace.id}/integrations`;
    const compound = await buildCompound();
    const assigned = await analyst
      .post(path)
      .send({ reason: 'Same time as the reference', assign: [{ peak: 2, compound: compound.id }] })
      .expect(201);
    expect(assigned.body.peaks.map((peak: PeakJson) => peak.compound)).toEqual([
      null,
      { id: compound.id, name: compound.name, cas: null },
      null,
    ]);
    expect(assigned.body.parameters).toEqual(trace.integration.parameters);
    const excluded = { exclude: [{ fromMin: 3, toMin: 3.5, reason: 'solvent' }] };
    const kept = await analyst
      .post(path)
      .send({ reason: 'Without the solvent', parameters: excluded })
      .expect(201);
    // The peak is now number 1 and is still the compound.
    expect(kept.body.peaks[0].compound.id).toBe(compound.id);
    const gone = await analyst
      .post(path)
      .send({ reason: 'Not sure after all', assign: [{ peak: 1, compound: null }] })
      .expect(201);
    expect(gone.body).toMatchObject({ version: 4, parameters: kept.body.parameters });
    expect(gone.body.peaks[0].compound).toBeNull();
  });

  it('counts versions without a gap or a double when several come at once', async () => {
    const { body: trace } = await readTrace();
    const answers = await Promise.all(
      [4, 5, 6, 7].map((minimumSignalToNoise) =>
        analyst
          .post(`/api/v1/traces/${trace.id}/integrations`)
          .send({ reason: 'All at once', parameters: { minimumSignalToNoise } }),
      ),
    );
    expect(answers.map((answer) => answer.status)).toEqual([201, 201, 201, 201]);
    expect(answers.map((answer) => answer.body.version).sort()).toEqual([2, 3, 4, 5]);
  });

  it.each([
    ['no reason', { parameters: {} }, 'reason'],
    ['an empty reason', { reason: '  ', parameters: {} }, 'reason'],
    [
      'a parameter out of its limits',
      { reason: 'test', parameters: { minimumAreaPercent: 90 } },
      'parameters.minimumAreaPercent',
    ],
    ['a peak that is not there', { reason: 'test', assign: [{ peak: 9, compound: null }] }, 'assign.0.peak'],
    [
      'a compound that is not there',
      { reason: 'test', assign: [{ peak: 1, compound: '71-43-2x' }] },
      'assign.0.compound',
    ],
    ['edits by hand', { reason: 'test', edits: [{ split: 1 }] }, 'edits'],
  ])('is refused with %s: 422 that names it', async (_, body, path) => {
    const { body: trace } = await readTrace();
    const answer = await analyst.post(`/api/v1/traces/${trace.id}/integrations`).send(body).expect(422);
    expect(answer.body.errors[0].path).toBe(path);
  });
});

describe('who may', () => {
  it('read traces: members; make and integrate them: analysts; nobody of another group', async () => {
    const { body: trace, fraction, evidenceId } = await readTrace();
    await chemist.get(`/api/v1/traces/${trace.id}`).expect(200);
    const again = { evidenceId, fraction: fraction.code, subject: 'fraction' };
    await chemist.post('/api/v1/traces').send(again).expect(403);
    const integrate = { reason: 'to see whether I may', parameters: {} };
    await chemist.post(`/api/v1/traces/${trace.id}/integrations`).send(integrate).expect(403);
    const stranger = await sessionFor(['analyst'], await buildGroup());
    await stranger.get(`/api/v1/traces/${trace.id}`).expect(404);
    await stranger.get(`/api/v1/traces/${trace.id}/points`).expect(404);
    await stranger.get(`/api/v1/traces/${trace.id}/integrations`).expect(404);
    await stranger.get(`/api/v1/integrations/${trace.integration.id}`).expect(404);
    await stranger.post('/api/v1/traces').send(again).expect(404);
    await stranger.post(`/api/v1/traces/${trace.id}/integrations`).send(integrate).expect(404);
    await stranger.post(`/api/v1/evidence/${evidenceId}/trace-preview`).send({}).expect(404);
  });

  it('not a fraction of another run: 422', async () => {
    const evidenceId = await storedForRun(freshCsv());
    const other = await buildFraction({ run: await buildRun({ group }) });
    const { body } = await analyst
      .post('/api/v1/traces')
      .send({ evidenceId, fraction: other.code, subject: 'fraction' })
      .expect(422);
    expect(body.detail).toMatch(/another run/);
  });
});

const sample = '../shared/samples/gc-fid.csv';
describe('a real file without a time axis', () => {
  if (!existsSync(sample)) console.info(`${sample} is not here: the real file is not tried.`);
  it.runIf(existsSync(sample))('asks for the sampling rate, and is read with it', async () => {
    const evidenceId = await storedForRun(readFileSync(sample));
    const fraction = await freshFraction();
    const given = { evidenceId, fraction: fraction.code, subject: 'fraction', detector: 'FID' };
    const { body: problem } = await analyst.post('/api/v1/traces').send(given).expect(422);
    expect(problem.errors[0].path).toBe('read.samplingHz');
    const { body } = await analyst
      .post('/api/v1/traces')
      .send({ ...given, read: { samplingHz: 5 } })
      .expect(201);
    expect(body.pointCount).toBeGreaterThan(1000);
    expect(body.durationMin).toBeCloseTo((body.pointCount - 1) / 300, 6);
    expect(body.integration.peaks.length).toBeGreaterThan(3);
  });
});
