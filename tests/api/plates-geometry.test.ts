import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/lib/database/connection';
import { photographPlate, sendPlatePhoto, tiltedScene, trueMarks, views } from '../factories/marked-plate';
import type { RenderedPlate } from '../factories/plate-renderer/render-plate';
import { buildEthylAcetate, buildFraction, buildGroup, buildRun, buildUser } from '../factories/records';
import { asBytes } from '../support/bytes';
import { type Agent, signedIn, stopTestServer } from '../support/test-server';

let run: Awaited<ReturnType<typeof buildRun>>;
let fraction: Awaited<ReturnType<typeof buildFraction>>;
let analyst: Agent;
let tilted: RenderedPlate;
let otherwise: RenderedPlate;
let evidenceId: string;

type View = {
  id: string;
  photos: {
    evidenceId: string;
    lanes: { spots: Spot[]; x: number; plateX: number }[];
    [key: string]: unknown;
  }[];
  lanes: { spots: Spot[]; plateX: number; id: string }[];
  [key: string]: unknown;
};
type Spot = {
  x: number;
  y: number;
  rf: number;
  hRf: number;
  rfUncertainty: number;
  plateX: number;
  plateY: number;
  flags: string[];
  projections: { evidenceId: string; x: number; y: number }[];
};

const marks = (change: Record<string, unknown> = {}, photo = tilted) => {
  const truth = trueMarks(photo);
  const subjects = [
    { kind: 'crude' },
    { kind: 'fraction', code: fraction.code },
    { kind: 'reference' },
    { kind: 'reference' },
    { kind: 'blank' },
  ];
  const lanes = truth.lanes.map((lane, l) => ({
    ...lane,
    label: `${l + 1}`,
    subject: subjects[l],
    ...(l === 2 && { dilutionPercent: 1 }),
    ...(l === 3 && { dilutionPercent: 10 }),
  }));
  return {
    evidenceId,
    stationaryPhase: 'silica gel 60 F254',
    eluent: 'hexane / ethyl acetate 4:1',
    visualiser: 'uv-254',
    widthMm: 50,
    heightMm: 100,
    ...truth,
    lanes,
    ...change,
  };
};
const post = (change: Record<string, unknown> = {}) =>
  analyst.post(`/api/v1/runs/${run.code}/plates`).send(marks(change));
const patch = (id: string, tag: string, change: Record<string, unknown>) =>
  analyst.patch(`/api/v1/plates/${id}`).set('If-Match', tag).send(change);

beforeAll(async () => {
  [tilted, otherwise] = await Promise.all([
    photographPlate(tiltedScene, views.tilted),
    photographPlate(tiltedScene, views.otherwise),
  ]);
  const group = await buildGroup();
  run = await buildRun({ group, target: await buildEthylAcetate() });
  fraction = await buildFraction({ run });
  const person = await buildUser({ group, roles: ['analyst'] });
  analyst = await signedIn({ email: person.email, password: person.plainPassword });
  evidenceId = await sendPlatePhoto(analyst, run.code, tilted.jpeg);
});
afterAll(stopTestServer);

const everySpot = (body: View) =>
  tiltedScene.lanes.flatMap((lane, l) =>
    lane.spots.map((spot, s) => ({ lane, spot, seen: body.lanes[l]!.spots[s]! })),
  );

describe('a plate photographed at 24 degrees', () => {
  it('has Rf within 0.01 of the truth, in millimetres on the plate', async () => {
    const { body } = await post().expect(201);
    expect(everySpot(body)).toHaveLength(5);
    for (const { lane, spot, seen } of everySpot(body)) {
      expect(Math.abs(seen.rf - spot.rf)).toBeLessThan(0.01);
      expect(seen.hRf).toBeCloseTo(100 * seen.rf, 10);
      expect(seen.plateX).toBeCloseTo(lane.xMm, 3);
      expect(seen.flags).toEqual([]);
      // 0.5 mm each for spot, front and baseline over about 75 mm (JCGM 100:2008, 5.1.2).
      expect(seen.rfUncertainty).toBeCloseTo(
        (0.5 * Math.sqrt(1 + spot.rf ** 2 + (1 - spot.rf) ** 2)) / 75,
        3,
      );
    }
    tiltedScene.lanes.forEach((lane, l) => expect(body.lanes[l].plateX).toBeCloseTo(lane.xMm, 1));
    expect(body).toMatchObject({ flags: [], photos: [{ plateUnit: 'mm' }] });
    const again = await analyst.get(`/api/v1/plates/${body.id}`).expect(200);
    expect(again.body).toEqual(body);
  });

  it('has the same Rf in relative units where no size is known, and is further off without corners', async () => {
    const { body } = await post({ widthMm: null, heightMm: null }).expect(201);
    for (const { lane, spot, seen } of everySpot(body)) {
      expect(Math.abs(seen.rf - spot.rf)).toBeLessThan(0.01);
      expect(seen.plateX).toBeCloseTo(lane.xMm / 50, 4);
      expect(seen.flags).toEqual(['scale not known']);
    }
    expect(body.photos[0].plateUnit).toBe('relative');
    const flat = await post({ corners: undefined }).expect(201);
    const worst = Math.max(...everySpot(flat.body).map(({ spot, seen }) => Math.abs(seen.rf - spot.rf)));
    expect(worst).toBeGreaterThan(0.01);
    expect(flat.body.flags).toContain('perspective not corrected');
    expect(flat.body.lanes[0].spots[0]).toMatchObject({ plateX: null, plateY: null });
  });

  it('refuses what cannot be, naming the field', async () => {
    const [a, b, c, d] = tilted.truth.corners;
    const say = async (change: Record<string, unknown>) => {
      const { body } = await post(change).expect(422);
      return body.errors[0].path as string;
    };
    expect(await say({ corners: [a, c, b, d] })).toBe('corners');
    expect(await say({ corners: [b, a, d, c] })).toBe('corners');
    expect(await say({ corners: [a, a, c, d] })).toBe('corners');
    expect(await say({ corners: [a, b, c] })).toBe('corners');
    const lanes = marks().lanes;
    const outside = [{ ...lanes[0]!, spots: [{ x: a!.x - 60, y: a!.y + 300 }] }];
    expect(await say({ lanes: outside })).toBe('lanes.0.spots.0');
    expect(await say({ lanes: [{ ...lanes[0]!, x: a!.x - 120, spots: [] }] })).toBe('lanes.0.x');
    expect(await say({ baseline: marks().front, front: marks().baseline })).toBe('front');
    expect(await say({ lanes: [{ ...lanes[0]!, dilutionPercent: 0 }] })).toBe('lanes.0.dilutionPercent');
  });
});

describe('two photos of one plate', () => {
  it('share the geometry: lines and lanes are carried over, and each shows the spots of the other', async () => {
    const first = await post();
    const stained = await sendPlatePhoto(analyst, run.code, otherwise.jpeg);
    const { corners, lanes } = trueMarks(otherwise);
    const added = await patch(first.body.id, first.headers.etag!, {
      evidenceId: stained,
      visualiser: 'permanganate',
      units: 'px',
      corners,
    }).expect(200);
    const [uv, stain] = (added.body as View).photos;
    expect(stain!.lanes.map((lane) => lane.spots.length)).toEqual([0, 0, 0, 0, 0]);
    stain!.lanes.forEach((lane, l) => {
      expect(Math.abs(lane.x - otherwise.truth.lanes[l]!.x)).toBeLessThan(4);
      if (Number.isFinite(lane.plateX)) expect(lane.plateX).toBeCloseTo(tiltedScene.lanes[l]!.xMm, 0);
    });
    uv!.lanes.forEach((lane, l) =>
      lane.spots.forEach((spot, s) => {
        const truth = otherwise.truth.lanes[l]!.spots[s]!;
        expect(spot.projections).toHaveLength(1);
        expect(spot.projections[0]!.evidenceId).toBe(stained);
        expect(Math.hypot(spot.projections[0]!.x - truth.x, spot.projections[0]!.y - truth.y)).toBeLessThan(
          0.5,
        );
      }),
    );

    // The crude is marked on the stain too: the same two spots, not four.
    const changed = stain!.lanes.map((lane, l) => ({
      ...marks().lanes[l]!,
      x: lane.x,
      spots: l === 0 ? lanes[0]!.spots : [],
    }));
    const both = await patch(first.body.id, added.headers.etag!, { lanes: changed }).expect(200);
    const crude = both.body.distinctSpots[0];
    expect(crude.spots).toHaveLength(2);
    for (const spot of crude.spots)
      expect(spot.seenIn.map((one: { visualiser: string }) => one.visualiser).sort()).toEqual([
        'permanganate',
        'uv-254',
      ]);
  });

  it('keep it together: a line that was carried over follows, one that was drawn anew stays', async () => {
    const first = await post();
    const stained = await sendPlatePhoto(analyst, run.code, otherwise.jpeg);
    const { corners, front, lanes } = trueMarks(otherwise);
    const added = await patch(first.body.id, first.headers.etag!, {
      evidenceId: stained,
      visualiser: 'permanganate',
      corners,
      front: [front[0], front.at(-1)],
    }).expect(200);
    const spotted = await patch(first.body.id, added.headers.etag!, {
      lanes: marks().lanes.map((lane, l) => ({ ...lane, x: added.body.lanes[l].x, spots: lanes[l]!.spots })),
    }).expect(200);
    const lower = marks().baseline.map(({ x, y }) => ({ x, y: y + 12 }));
    const moved = await patch(first.body.id, spotted.headers.etag!, { evidenceId, baseline: lower }).expect(
      200,
    );
    const [uv, stain] = (moved.body as View).photos;
    const [, wasStain] = (spotted.body as View).photos;
    expect(stain!.baseline).not.toEqual(wasStain!.baseline);
    expect(stain!.front).toEqual(wasStain!.front);
    uv!.lanes[1]!.spots.forEach((spot) => expect(spot.rf).toBeGreaterThan(0.325));
    expect(stain!.lanes[1]!.spots[0]!.rf).toBeGreaterThan(wasStain!.lanes[1]!.spots[0]!.rf + 0.005);
    expect(moved.body.evidenceId).toBe(evidenceId);
  });

  it('measures the other photos anew when the size of the plate is corrected', async () => {
    const first = await post({ widthMm: null, heightMm: null });
    const stained = await sendPlatePhoto(analyst, run.code, otherwise.jpeg);
    const { corners } = trueMarks(otherwise);
    const added = await patch(first.body.id, first.headers.etag!, {
      evidenceId: stained,
      visualiser: 'permanganate',
      corners,
      widthMm: 50,
      heightMm: 100,
    }).expect(200);
    const [uv] = (added.body as View).photos;
    expect(uv!.flags).toEqual([]);
    expect(uv!.lanes[0]!.spots[0]!.flags).toEqual([]);
    expect(uv!.lanes[0]!.spots[0]!.plateX).toBeCloseTo(8, 1);
  });
});

describe('what the lanes say', () => {
  it('compares with references on the plate and crude with fraction, in words', async () => {
    const { body } = await post().expect(201);
    const [photo] = body.photos;
    const crude = photo.comparisons.filter((one: { label: string }) => one.label === '1');
    expect(crude.map((one: { agreesWith: unknown[] }) => one.agreesWith.length)).toEqual([0, 2]);
    expect(crude[1].words).toContain('agrees with lane');
    const [change] = photo.beforeAfter;
    expect(change.disappeared.map((one: { rf: number }) => one.rf.toFixed(1))).toEqual(['0.7']);
    expect(change.stayed.map((one: { rf: number }) => one.rf.toFixed(1))).toEqual(['0.3']);
    // Ethyl acetate boils at 77 °C and has no chromophore.
    expect(change.notSeeable[0]).toMatchObject({ isTarget: true, compound: { name: 'ethyl acetate' } });
  });

  it('keeps the proposal and counts in the audit trail what became of it', async () => {
    const truth = trueMarks(tilted);
    const proposal = {
      ...truth,
      lanes: truth.lanes.map((lane) => ({
        x: lane.x,
        spots: lane.spots.map((spot) => ({ ...spot, rf: null, relativeIntensity: 0.5 })),
      })),
      confidence: 0.8,
      methodVersion: 'test-1',
    };
    const lanes = marks().lanes.map((lane, l) => ({
      ...lane,
      spots: l === 0 ? [{ ...lane.spots[0]!, y: lane.spots[0]!.y + 6 }] : lane.spots,
    }));
    const { body } = await post({ proposal, lanes }).expect(201);
    // 4 corners, 2 and 5 points of the lines, 5 lanes, 5 spots: one spot moved, one removed.
    expect(body.photos[0].proposal).toEqual({
      accepted: 19,
      moved: 1,
      added: 0,
      removed: 1,
      methodVersion: 'test-1',
    });
    const [event] = await database().query<{ after: string }>(
      "SELECT `after` FROM audit_events WHERE recordId = ? AND type = 'plate.marked'",
      { replacements: [body.id], type: QueryTypes.SELECT },
    );
    const after = typeof event!.after === 'string' ? JSON.parse(event!.after) : event!.after;
    expect(after.photos[0].proposal).toMatchObject({ accepted: 19, moved: 1, removed: 1 });
  });
});

describe('what the server reads from the photo', () => {
  it('profiles the lanes and says that the fraction is fainter than the 1 % lane', async () => {
    const plate = await post().expect(201);
    const { body } = await analyst.get(`/api/v1/plates/${plate.body.id}/profiles`).expect(200);
    expect(body.lanes).toHaveLength(5);
    for (const lane of body.lanes) expect(lane.rf.length).toBeLessThanOrEqual(300);
    const [crude, own] = body.lanes;
    expect(
      crude.areas
        .map((one: { percentOfLane: number }) => one.percentOfLane)
        .reduce((a: number, b: number) => a + b),
    ).toBeCloseTo(100, 6);
    const top = own.rf[own.signal.indexOf(Math.max(...own.signal))];
    expect(Math.abs(top - 0.32)).toBeLessThan(0.02);
    const estimate = body.estimates.find((one: { label: string }) => one.label === '2');
    expect(estimate).toMatchObject({ state: 'fainter', belowPercent: 1 });
    expect(estimate.words).toContain('fainter than the 1 % lane');
    expect(body.limits).toContain('semi-quantitative');
  });

  it('gives the plate as seen from above, without metadata', async () => {
    const plate = await post().expect(201);
    const path = `/api/v1/plates/${plate.body.id}/rectified?photo=${evidenceId}&width=300`;
    const picture = await analyst.get(path).buffer(true).parse(asBytes).expect(200);
    expect(picture.headers['content-type']).toBe('image/webp');
    const { default: sharp } = await import('sharp');
    const meta = await sharp(picture.body).metadata();
    expect([meta.width, meta.height]).toEqual([300, 600]);
    expect(meta.exif).toBeUndefined();
    await analyst.get(path).set('If-None-Match', picture.headers.etag!).expect(304);
    // A spot is dark where it truly lies: lane 2, Rf 0.32.
    const { data } = await sharp(picture.body).greyscale().raw().toBuffer({ resolveWithObject: true });
    const mm = (x: number, y: number) => data[Math.round(y * 6) * 300 + Math.round(x * 6)]!;
    const spot = plate.body.lanes[1].spots[0];
    expect(mm(spot.plateX, spot.plateY)).toBeLessThan(0.6 * mm(spot.plateX, spot.plateY - 10));
    const flat = await post({ corners: undefined }).expect(201);
    await analyst.get(`/api/v1/plates/${flat.body.id}/rectified`).expect(422);
  });

  it('proposes marks that give Rf within 0.01 when they are accepted, and saves nothing', async () => {
    const { body } = await analyst.post(`/api/v1/evidence/${evidenceId}/plate-suggestion`).expect(200);
    expect(body.confidence).toBeGreaterThan(0);
    const accepted = {
      corners: body.corners,
      baseline: body.baseline,
      front: body.front,
      lanes: body.lanes.map((lane: { x: number; spots: { x: number; y: number }[] }, l: number) => ({
        label: `${l + 1}`,
        x: lane.x,
        subject: { kind: 'crude' },
        spots: lane.spots.map(({ x, y }) => ({ x, y })),
      })),
    };
    const plate = await post({ ...accepted, proposal: body }).expect(201);
    const found = plate.body.lanes.flatMap((lane: { spots: Spot[] }) => lane.spots) as Spot[];
    expect(found.length).toBeGreaterThanOrEqual(4);
    for (const spot of found)
      expect(Math.min(...[0.32, 0.7].map((rf) => Math.abs(rf - spot.rf)))).toBeLessThan(0.01);
    expect(plate.body.photos[0].proposal).toMatchObject({ moved: 0, added: 0, removed: 0 });
    const text = await analyst
      .post(`/api/v1/evidence?run=${run.code}&kind=document`)
      .set('Content-Type', 'text/plain')
      .set('X-Filename', 'note.txt')
      .send('A note, invented for a test.\n');
    const refused = await analyst
      .post(`/api/v1/evidence/${text.body.evidence.id}/plate-suggestion`)
      .expect(422);
    expect(refused.body.detail).toContain('no plate photo');
  });
});
