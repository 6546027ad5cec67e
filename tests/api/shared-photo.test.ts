import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { recorded } from '@/lib/audit/recorded';
import { systemActor } from '@/lib/auth/actor';
import { Share } from '@/lib/database/records';
import { buildFraction } from '../factories/records';
import { type Bench, buildBench, buildSubmittedFraction, release } from '../factories/signing-bench';
import { type Agent, anonymous, stopTestServer, unique } from '../support/test-server';

let bench: Bench;
let visitor: Agent;
beforeAll(async () => {
  bench = await buildBench();
  visitor = await anonymous();
});
afterAll(stopTestServer);

/** A photo with a description inside, filed under a fraction (or the run), and its id. */
async function sendPhoto(place: string): Promise<string> {
  const bytes = await sharp({ create: { width: 600, height: 900, channels: 3, background: '#7fbf7f' } })
    .jpeg()
    .withExifMerge({ IFD0: { ImageDescription: unique('taken at') } })
    .toBuffer();
  const { body } = await bench.chemist.agent
    .post(`/api/v1/evidence?${place}&kind=plate-photo`)
    .set('Content-Type', 'image/jpeg')
    .set('X-Filename', 'plate.jpg')
    .send(bytes)
    .expect(201);
  return body.evidence.id as string;
}

/** A signed-off fraction with a marked plate, and an open link to it. */
async function shareOne() {
  const fraction = await buildSubmittedFraction(bench);
  const onPlate = await sendPhoto(`run=${bench.run.code}`);
  const filed = await sendPhoto(`fraction=${fraction.code}`);
  const { body: text } = await bench.chemist.agent
    .post(`/api/v1/evidence?fraction=${fraction.code}&kind=document`)
    .set('Content-Type', 'text/plain')
    .set('X-Filename', 'notes.txt')
    .send(unique('notes'))
    .expect(201);
  await bench.chemist.agent
    .post(`/api/v1/runs/${bench.run.code}/plates`)
    .send({
      evidenceId: onPlate,
      stationaryPhase: 'silica gel 60 F254',
      eluent: 'hexane / ethyl acetate 4:1',
      visualiser: 'uv-254',
      units: 'px',
      baseline: [{ x: 0, y: 800 }],
      front: [{ x: 0, y: 100 }],
      lanes: [
        { label: '1', subject: { kind: 'fraction', code: fraction.code }, spots: [{ x: 200, y: 400 }] },
      ],
    })
    .expect(201);
  const at = `/api/v1/fractions/${fraction.code}`;
  await bench.analyst.agent.post(`${at}/sign-off`).send(release(bench.analyst)).expect(200);
  const { body: share } = await bench.pi.agent.post(`${at}/shares`).send({ expiresInDays: 5 }).expect(201);
  const photoAt = (id: string, token = share.token as string) => `/share/${token}/photo/${id}`;
  return { at, share, onPlate, filed, textId: text.evidence.id as string, photoAt };
}

describe('photos on a shared sheet', () => {
  it('are seen without an account, re-encoded and without what the camera wrote', async () => {
    const { share, onPlate, filed, photoAt } = await shareOne();
    const page = await visitor.get(`/share/${share.token}`).expect(200);
    expect(page.text).toContain(photoAt(onPlate));
    for (const id of [onPlate, filed]) {
      const { body, headers } = await visitor.get(`${photoAt(id)}?width=256`).expect(200);
      expect(headers['content-type']).toBe('image/webp');
      expect(headers['cache-control']).toBe('private, no-cache');
      const facts = await sharp(body as Buffer).metadata();
      expect(facts).toMatchObject({ format: 'webp', width: 256 });
      expect(facts.exif).toBeUndefined();
    }
  });

  it('are those of this fraction only, and nothing but photos', async () => {
    const { onPlate, textId, photoAt } = await shareOne();
    const other = await buildFraction({ run: bench.run });
    const elsewhere = await sendPhoto(`fraction=${other.code}`);
    const unmarked = await sendPhoto(`run=${bench.run.code}`);
    await visitor.get(photoAt(elsewhere)).expect(404);
    await visitor.get(photoAt(unmarked)).expect(404);
    await visitor.get(photoAt(textId)).expect(404);
    await visitor.get(photoAt('no-id')).expect(404);
    await visitor.get(photoAt(onPlate, 'x'.repeat(43))).expect(404);
  });

  it('are gone when the link is revoked, has expired, or the fraction is worked on again', async () => {
    const revoked = await shareOne();
    const first = await visitor.get(revoked.photoAt(revoked.onPlate)).expect(200);
    await bench.pi.agent.delete(`${revoked.at}/shares?id=${revoked.share.id}`).expect(204);
    await visitor
      .get(revoked.photoAt(revoked.onPlate))
      .set('If-None-Match', String(first.headers.etag))
      .expect(404);

    const expired = await shareOne();
    await recorded(systemActor('Test'), async ({ transaction, record }) => {
      const row = await Share.findByPk(expired.share.id as string, { transaction, rejectOnEmpty: true });
      await row.update({ expiresAt: new Date(Date.now() - 1000) }, { transaction });
      record({ type: 'share.revoked', recordType: 'fraction', recordId: row.fractionId });
    });
    await visitor.get(expired.photoAt(expired.onPlate)).expect(404);

    const reopened = await shareOne();
    await bench.pi.agent.post(`${reopened.at}/reopen`).send({ reason: 'label was wrong' }).expect(200);
    await visitor.get(reopened.photoAt(reopened.onPlate)).expect(404);
  });
});
