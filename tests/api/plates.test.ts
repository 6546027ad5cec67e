import { randomBytes } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/lib/database/connection';
import { Fraction, Plate } from '@/lib/database/records';
import { type DrawnPlate, drawPlatePhoto } from '../factories/plate-photo';
import {
  buildEthylAcetate,
  buildFraction,
  buildGroup,
  buildRun,
  buildToken,
  buildUser,
} from '../factories/records';
import { type Agent, signedIn, stopTestServer, withToken } from '../support/test-server';

let group: Awaited<ReturnType<typeof buildGroup>>;
let run: Awaited<ReturnType<typeof buildRun>>;
let first: Awaited<ReturnType<typeof buildFraction>>;
let second: Awaited<ReturnType<typeof buildFraction>>;
let analyst: Agent;
let drawn: DrawnPlate;
let evidenceId: string;

const truth = [
  { spots: [{ rf: 0.44 }] },
  { spots: [{ rf: 0.44 }, { rf: 0.71, strength: 0.3 }] },
  { spots: [] },
];

async function sendPhoto(agent: Agent, query: string, jpeg: Buffer): Promise<string> {
  const { body } = await agent
    .post(`/api/v1/evidence?${query}`)
    .set('Content-Type', 'image/jpeg')
    .set('X-Filename', 'plate.jpg')
    .send(Buffer.concat([jpeg, randomBytes(8)]));
  return body.evidence.id as string;
}

const marks = (change: Record<string, unknown> = {}) => ({
  evidenceId,
  stationaryPhase: 'silica gel 60 F254 on aluminium',
  eluent: 'hexane / ethyl acetate 4:1',
  visualiser: 'UV 254 nm',
  units: 'px',
  baseline: [
    { x: 0, y: drawn.baselineY },
    { x: drawn.widthPx, y: drawn.baselineY },
  ],
  front: [
    { x: 0, y: drawn.frontY },
    { x: drawn.widthPx, y: drawn.frontY },
  ],
  lanes: drawn.lanes.map((lane, index) => ({
    label: `${index + 1}`,
    x: lane.x,
    subject: [{ kind: 'fraction', code: first.code }, { kind: 'crude' }, { kind: 'blank' }][index],
    spots: lane.spots.map(({ x, y }) => ({ x, y })),
  })),
  ...change,
});
const post = (agent: Agent, change: Record<string, unknown> = {}, code = run.code) =>
  agent.post(`/api/v1/runs/${code}/plates`).send(marks(change));

beforeAll(async () => {
  drawn = await drawPlatePhoto({ lanes: truth });
  group = await buildGroup();
  run = await buildRun({ group });
  first = await buildFraction({ run });
  second = await buildFraction({ run });
  const person = await buildUser({ group, roles: ['analyst'] });
  analyst = await signedIn({ email: person.email, password: person.plainPassword });
  evidenceId = await sendPhoto(analyst, `run=${run.code}`, drawn.jpeg);
});
afterAll(stopTestServer);

describe('marking a plate', () => {
  it('finds the Rf that the plate was drawn with', async () => {
    const { body, headers } = await post(analyst).expect(201);
    expect(headers.etag).toBe(`"${body.version}"`);
    truth.forEach((lane, l) =>
      lane.spots.forEach((spot, s) => {
        expect(Math.abs(body.lanes[l].spots[s].rf - spot.rf)).toBeLessThan(0.01);
        expect(body.lanes[l].spots[s].rfUncertainty).toBeGreaterThan(0.005);
      }),
    );
    expect(body.lanes[0].spots[0].flags).toContain('perspective not corrected');
    expect(body.flags).toContain('perspective not corrected');
    expect(body).toMatchObject({ run: run.code, visualiser: 'uv-254', units: 'px', evidenceId });
    expect(body.lanes[2]).toMatchObject({ label: '3', subject: { kind: 'blank' }, spots: [] });
    const again = await analyst.get(`/api/v1/plates/${body.id}`).expect(200);
    expect(again.body).toEqual(body);
    const list = await analyst.get(`/api/v1/runs/${run.code}/plates?limit=1`).expect(200);
    expect(list.body.items[0].id).toBe(body.id);
  });

  it('takes plate millimetres, measured from either edge, without the flag', async () => {
    // b = 10, f = 60, s = 32 mm: Rf 0.44, u 0.0123 (JCGM 100:2008, 5.1.2).
    const { body } = await post(analyst, {
      units: 'mm',
      widthMm: 50,
      heightMm: 100,
      baseline: [{ x: 0, y: 10 }],
      front: [{ x: 0, y: 60 }],
      lanes: [
        {
          label: 'F',
          subject: { kind: 'fraction', code: first.code },
          spots: [{ x: 20, y: 32, shape: 'streak' }],
        },
      ],
    }).expect(201);
    expect(body.lanes[0].spots[0].rf).toBeCloseTo(0.44, 6);
    expect(body.lanes[0].spots[0].rfUncertainty).toBeCloseTo(0.0123, 4);
    expect(body.lanes[0].spots[0].flags).toEqual(['streak']);
    expect(body.flags).toEqual([]);
  });

  it('refuses corners that outline no plate', async () => {
    const corners = [
      { x: 0, y: 0 },
      { x: 10, y: 0 },
      { x: 10, y: 10 },
      { x: 0, y: 10 },
    ];
    const { body } = await post(analyst, { corners }).expect(422);
    expect(body.detail).toContain('corners of the whole plate');
    expect(body.errors[0].path).toBe('corners');
  });

  it('names each mark that is wrong and writes nothing', async () => {
    const before = await Plate.count({ where: { runId: run.id } });
    const lane = { label: '1', subject: { kind: 'crude' } };
    const beyond = await post(analyst, {
      lanes: [
        {
          ...lane,
          spots: [
            { x: 100, y: drawn.frontY - 60 },
            { x: 100, y: drawn.baselineY + 100 },
          ],
        },
      ],
    }).expect(422);
    expect(beyond.body.errors.map((one: { path: string }) => one.path)).toEqual([
      'lanes.0.spots.0',
      'lanes.0.spots.1',
    ]);
    const off = await post(analyst, { lanes: [{ ...lane, x: 5000, spots: [] }] }).expect(422);
    expect(off.body.detail).toContain('off the plate');
    const swapped = await post(analyst, { baseline: marks().front, front: marks().baseline }).expect(422);
    expect(swapped.body.errors[0].path).toBe('front');
    await post(analyst, { lanes: [] }).expect(422);
    await post(analyst, { baseline: [] }).expect(422);
    await post(analyst, { colour: 'green' }).expect(422);
    expect(await Plate.count({ where: { runId: run.id } })).toBe(before);
  });

  it('takes only fractions of the same run and compounds that are known', async () => {
    const other = await buildFraction({ run: await buildRun({ group }) });
    const compound = await buildEthylAcetate();
    const lane = (subject: unknown) => post(analyst, { lanes: [{ label: 'x', x: 100, subject, spots: [] }] });
    const foreign = await lane({ kind: 'fraction', code: other.code }).expect(422);
    expect(foreign.body.errors[0].path).toBe('lanes.0.subject.code');
    await lane({ kind: 'fraction' }).expect(422);
    await lane({ kind: 'reference', compound: '7732-18-5-0' }).expect(422);
    const byCas = await lane({ kind: 'reference', compound: '141-78-6' }).expect(201);
    expect(byCas.body.lanes[0].subject).toEqual({
      kind: 'reference',
      compound: { id: compound.id, name: 'ethyl acetate' },
    });
    const both = await lane({ kind: 'co-spot', code: first.code, compound: compound.id }).expect(201);
    expect(both.body.lanes[0].subject).toMatchObject({ kind: 'co-spot', code: first.code });
  });

  it('takes only a plate photo of the group that belongs to no other run, and makes it the run’s', async () => {
    const csv = await analyst
      .post(`/api/v1/evidence?run=${run.code}`)
      .set('X-Filename', 'a.csv')
      .set('Content-Type', 'text/csv')
      .send(`t,s\n${Array.from({ length: 9 }, (_, i) => `${i},${i}`).join('\n')}`);
    await post(analyst, { evidenceId: csv.body.evidence.id }).expect(422);
    const elsewhere = await sendPhoto(analyst, `run=${(await buildRun({ group })).code}`, drawn.jpeg);
    await post(analyst, { evidenceId: elsewhere }).expect(422);
    const token = await withToken((await buildToken({ group })).token);
    const waiting = await sendPhoto(token, '', drawn.jpeg);
    await post(analyst, { evidenceId: waiting }).expect(201);
    const { body } = await analyst.get(`/api/v1/evidence/${waiting}`).expect(200);
    expect(body.evidence.run).toBe(run.code);
    const tray = await analyst.get('/api/v1/tray?limit=200').expect(200);
    expect(tray.body.items.some((item: { evidence: { id: string } }) => item.evidence.id === waiting)).toBe(
      false,
    );
  });

  it('supersedes the signature of every fraction that a lane names', async () => {
    const fractions = [];
    for (let index = 0; index < 2; index += 1)
      fractions.push(await buildFraction({ run, status: 'signed off' }));
    await post(analyst, {
      lanes: fractions.map(({ code }, index) => ({
        label: code,
        x: 100 + 50 * index,
        subject: { kind: 'fraction', code },
        spots: [],
      })),
    }).expect(201);
    for (const { id } of fractions) expect((await Fraction.findByPk(id))?.status).toBe('reopened');
  });

  it('stays apart when several plates name the same fractions at once in different order', async () => {
    const lanes = [first, second].map(({ code }, index) => ({
      label: code,
      x: 100 + 50 * index,
      subject: { kind: 'fraction', code },
      spots: [],
    }));
    const answers = await Promise.all(
      Array.from({ length: 6 }, (_, index) =>
        post(analyst, { lanes: index % 2 ? lanes : [...lanes].reverse() }),
      ),
    );
    expect(answers.map((answer) => answer.status)).toEqual([201, 201, 201, 201, 201, 201]);
  });
});

describe('changing the marks of a plate', () => {
  const patch = (agent: Agent, id: string, version: string | null, change: Record<string, unknown>) => {
    const request = agent.patch(`/api/v1/plates/${id}`).send(change);
    return version === null ? request : request.set('If-Match', version);
  };

  it('replaces them, counts the version on, and keeps before and after in the audit trail', async () => {
    const { body: plate, headers } = await post(analyst).expect(201);
    const lanes = [
      {
        label: 'F2',
        subject: { kind: 'fraction', code: second.code },
        spots: [{ x: 300, y: (drawn.baselineY + drawn.frontY) / 2 }],
      },
    ];
    const { body } = await patch(analyst, plate.id, headers.etag!, { lanes }).expect(200);
    expect(body.version).toBeGreaterThan(plate.version);
    expect(body.lanes).toHaveLength(1);
    expect(body.lanes[0].spots[0].rf).toBeCloseTo(0.5, 2);
    expect(body.eluent).toBe(plate.eluent);
    const [event] = await database().query<{ before: string; after: string }>(
      "SELECT `before`, `after` FROM audit_events WHERE recordId = ? AND type = 'plate.changed'",
      { replacements: [plate.id], type: QueryTypes.SELECT },
    );
    const parse = (value: unknown) => (typeof value === 'string' ? JSON.parse(value) : value);
    expect(parse(event!.before).photos[0].lanes).toHaveLength(3);
    expect(parse(event!.after).photos[0].lanes).toHaveLength(1);
  });

  it('needs the version that was seen', async () => {
    const { body: plate, headers } = await post(analyst).expect(201);
    await patch(analyst, plate.id, null, { eluent: 'toluene' }).expect(428);
    await patch(analyst, plate.id, headers.etag!, { eluent: 'toluene' }).expect(200);
    const stale = await patch(analyst, plate.id, headers.etag!, { eluent: 'heptane' }).expect(409);
    expect(stale.body.detail).toContain('Reload');
  });

  it('keeps the marks of each photo of the same plate apart', async () => {
    const { body: plate, headers } = await post(analyst).expect(201);
    const stained = await sendPhoto(analyst, `run=${run.code}`, drawn.jpeg);
    const added = await patch(analyst, plate.id, headers.etag!, {
      ...marks({ evidenceId: stained, visualiser: 'KMnO4' }),
    }).expect(200);
    expect(added.body.photos.map((photo: { visualiser: string }) => photo.visualiser)).toEqual([
      'uv-254',
      'permanganate',
    ]);
    expect(added.body.photos[0].lanes[0].spots).toHaveLength(1);
    const fewer = await patch(analyst, plate.id, added.headers.etag!, {
      lanes: marks().lanes.slice(0, 1),
    }).expect(422);
    expect(fewer.body.detail).toContain('another photo');
    const bare = await sendPhoto(analyst, `run=${run.code}`, drawn.jpeg);
    await patch(analyst, plate.id, added.headers.etag!, { evidenceId: bare }).expect(422);
  });
});

describe('who may mark', () => {
  it('is nobody outside the group, no PI, and no instrument', async () => {
    const { body: plate, headers } = await post(analyst).expect(201);
    const people = {
      stranger: await buildUser({ group: await buildGroup(), roles: ['chemist', 'analyst'] }),
      pi: await buildUser({ group, roles: ['pi'] }),
    };
    const stranger = await signedIn({
      email: people.stranger.email,
      password: people.stranger.plainPassword,
    });
    await post(stranger).expect(404);
    await stranger.get(`/api/v1/runs/${run.code}/plates`).expect(404);
    await stranger.get(`/api/v1/plates/${plate.id}`).expect(404);
    await stranger.patch(`/api/v1/plates/${plate.id}`).set('If-Match', headers.etag!).send({}).expect(404);
    const pi = await signedIn({ email: people.pi.email, password: people.pi.plainPassword });
    await pi.get(`/api/v1/plates/${plate.id}`).expect(200);
    await post(pi).expect(403);
    await pi.patch(`/api/v1/plates/${plate.id}`).set('If-Match', headers.etag!).send({}).expect(403);
    const token = await withToken((await buildToken({ group })).token);
    await post(token).expect(403);
  });
});
