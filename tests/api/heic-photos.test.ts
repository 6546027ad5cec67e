import { readFile } from 'node:fs/promises';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { buildGroup, buildRun, buildUser } from '../factories/records';
import { asBytes } from '../support/bytes';
import { type Agent, sha256, signedIn, stopTestServer } from '../support/test-server';

let run: Awaited<ReturnType<typeof buildRun>>;
let chemist: Agent;
let heic: Buffer;

const send = (bytes: Buffer) =>
  chemist
    .post(`/api/v1/evidence?run=${run.code}&kind=plate-photo`)
    .set('Content-Type', 'image/heic')
    .set('X-Filename', 'plate.heic')
    .send(bytes);

beforeAll(async () => {
  heic = await readFile('tests/fixtures/plate.heic');
  const group = await buildGroup();
  run = await buildRun({ group });
  const person = await buildUser({ group, roles: ['chemist'] });
  chemist = await signedIn({ email: person.email, password: person.plainPassword });
});
afterAll(stopTestServer);

describe('a HEIC photo from a phone', () => {
  it('is stored unchanged and told by its bytes, with its size', async () => {
    const { body } = await send(heic).expect(201);
    expect(body.evidence).toMatchObject({
      mediaType: 'image/heic',
      kind: 'plate-photo',
      widthPx: 400,
      heightPx: 600,
      sha256: sha256(heic),
    });
    const content = await chemist.get(body.links.content).buffer(true).parse(asBytes).expect(200);
    expect(content.body.equals(heic)).toBe(true);
  });

  it('has a preview without the position that the original carries', async () => {
    expect(heic.includes('Invented Camera Works')).toBe(true);
    const { body } = await send(heic);
    const preview = await chemist.get(`${body.links.preview}?width=256`).buffer(true).parse(asBytes);
    expect(preview.status).toBe(200);
    const meta = await sharp(preview.body).metadata();
    expect([meta.format, meta.width, meta.exif]).toEqual(['webp', 256, undefined]);
    expect(preview.body.includes('Invented Camera Works')).toBe(false);
    // The green of the layer, as it was drawn: 88, 196, 120 at the left edge.
    const { data } = await sharp(preview.body).raw().toBuffer({ resolveWithObject: true });
    const at = (200 * 256 + 8) * 3;
    [88, 196, 120].forEach((level, c) => expect(Math.abs(data[at + c]! - level)).toBeLessThan(10));
  });

  it('is looked at for a plate like any other photo', async () => {
    const { body } = await send(heic);
    const suggestion = await chemist
      .post(`/api/v1/evidence/${body.evidence.id}/plate-suggestion`)
      .expect(200);
    const spots = suggestion.body.lanes.flatMap((lane: { spots: { rf: number }[] }) => lane.spots);
    expect(spots.length).toBeGreaterThanOrEqual(2);
    for (const { rf } of spots) expect(Math.min(Math.abs(rf - 0.44), Math.abs(rf - 0.71))).toBeLessThan(0.02);
  });

  it('is refused when it is damaged or coded otherwise, and nothing is kept', async () => {
    const half = await send(heic.subarray(0, 1500)).expect(422);
    expect(half.body.detail).toContain('HEIC photo is damaged');
    const avif = Buffer.from(heic);
    avif.write('avif', 8, 'latin1');
    await send(avif).expect(415);
  });
});
