import { createHash, randomBytes } from 'node:crypto';
import { once } from 'node:events';
import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { get, type IncomingMessage } from 'node:http';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buffer } from 'node:stream/consumers';
import { QueryTypes } from 'sequelize';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { PutObjectCommand } from '@aws-sdk/client-s3';
import { database } from '@/lib/database/connection';
import { EvidenceFile, Fraction, TrayItem } from '@/lib/database/records';
import { objectStore } from '@/storage/client';
import { objectKeyFor } from '@/storage/keys';
import { findObjectByteLength } from '@/storage/read-object';
import { drawPlatePhoto } from '../factories/plate-photo';
import { buildFraction, buildGroup, buildRun, buildToken, buildUser } from '../factories/records';
import { asBytes } from '../support/bytes';
import { type Agent, sha256, signedIn, stopTestServer, testServer, withToken } from '../support/test-server';

const path = '/api/v1/evidence';
const trace = (rows = 40) =>
  Buffer.from(
    `time_min,signal_mV\n${Array.from({ length: rows }, (_, i) => `${(i / 10).toFixed(2)},${Math.sin(i).toFixed(4)}`).join('\n')}\n# ${randomBytes(8).toString('hex')}\n`,
  );
const digestOf = (bytes: Buffer) => `sha-256=:${createHash('sha256').update(bytes).digest('base64')}:`;

let group: Awaited<ReturnType<typeof buildGroup>>;
let chemist: Agent;
let token: Agent;
let fraction: Awaited<ReturnType<typeof buildFraction>>;
let photo: Buffer;
let spoolRoot: string;

const send = (agent: Agent, query: string, bytes: Buffer, name = 'file.bin') =>
  agent
    .post(`${path}${query}`)
    .set('Content-Type', 'application/octet-stream')
    .set('X-Filename', encodeURIComponent(name))
    .send(bytes);

beforeAll(async () => {
  // Drawn anew for each run of the tests: equal bytes would be one object.
  photo = Buffer.concat([(await drawPlatePhoto()).jpeg, randomBytes(16)]);
  group = await buildGroup();
  const user = await buildUser({ group, roles: ['chemist'] });
  chemist = await signedIn({ email: user.email, password: user.plainPassword });
  token = await withToken((await buildToken({ group })).token);
  // The server runs in this process: its temporary files go where they can be counted.
  spoolRoot = await mkdtemp(join(tmpdir(), 'heartcut-evidence-test-'));
  process.env.TMPDIR = spoolRoot;
  fraction = await buildFraction({ run: await buildRun({ group }) });
});
afterAll(async () => {
  await stopTestServer();
  await rm(spoolRoot, { recursive: true });
});
const spooled = () => readdir(join(spoolRoot, 'heartcut-spool'));

describe('sending evidence', () => {
  it('stores the very bytes, says their digest and writes an audit event', async () => {
    const { body } = await send(chemist, `?fraction=${fraction.code}`, photo, 'Platte α.jpg').expect(201);
    expect(body.evidence).toMatchObject({
      sha256: sha256(photo),
      sizeBytes: photo.length,
      mediaType: 'image/jpeg',
      kind: 'plate-photo',
      fileName: 'Platte α.jpg',
      widthPx: 600,
      heightPx: 900,
      fraction: fraction.code,
    });
    expect(body.links.content).toBe(`${path}/${body.evidence.id}/content`);
    expect(await findObjectByteLength(objectKeyFor(sha256(photo)))).toBe(photo.length);
    const events = await database().query<{ type: string }>(
      'SELECT type FROM audit_events WHERE recordId = ?',
      {
        replacements: [body.evidence.id],
        type: QueryTypes.SELECT,
      },
    );
    expect(events.map((event) => event.type)).toEqual(['evidence.uploaded']);
    const facts = await chemist.get(`${path}/${body.evidence.id}`).expect(200);
    expect(facts.body.evidence).toEqual(body.evidence);
  });

  it('answers the same bytes for the same fraction with 200 and the same id, also when five come at once', async () => {
    const bytes = trace();
    const answers = await Promise.all(
      Array.from({ length: 5 }, () =>
        send(chemist, `?fraction=${fraction.code}&kind=gc-trace`, bytes, 'a.csv'),
      ),
    );
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 200, 200, 200, 201]);
    expect(new Set(answers.map((answer) => answer.body.evidence.id)).size).toBe(1);
    expect(await EvidenceFile.count({ where: { sha256: sha256(bytes) } })).toBe(1);
  });

  it('takes multipart, keeps the file name, and checks the digest of the whole body', async () => {
    const bytes = trace();
    const boundary = 'heartcut-test-boundary';
    const body = Buffer.concat([
      Buffer.from(
        `--${boundary}\r\nContent-Disposition: form-data; name="note"\r\n\r\nx\r\n--${boundary}\r\nContent-Disposition: form-data; name="file"; filename="läuft.csv"\r\nContent-Type: text/csv\r\n\r\n`,
      ),
      bytes,
      Buffer.from(`\r\n--${boundary}--\r\n`),
    ]);
    const post = (digest: string) =>
      chemist
        .post(`${path}?fraction=${fraction.code}`)
        .set('Content-Type', `multipart/form-data; boundary=${boundary}`)
        .set('Content-Digest', digest)
        .send(body);
    await post(digestOf(bytes)).expect(400);
    expect(await EvidenceFile.count({ where: { sha256: sha256(bytes) } })).toBe(0);
    const answer = await post(digestOf(body)).expect(201);
    expect(answer.body.evidence).toMatchObject({
      sha256: sha256(bytes),
      fileName: 'läuft.csv',
      kind: 'gc-trace',
    });
  });

  it('refuses a multipart body without the part "file", with two files, and one that is cut off', async () => {
    const at = `${path}?fraction=${fraction.code}`;
    await chemist.post(at).attach('photo', photo, 'p.jpg').expect(422);
    await chemist.post(at).field('note', 'x').expect(422);
    const two = await chemist
      .post(at)
      .attach('file', trace(), 'a.csv')
      .attach('file', trace(), 'b.csv')
      .expect(422);
    expect(two.body.detail).toContain('one file');
    const cut = await chemist
      .post(at)
      .set('Content-Type', 'multipart/form-data; boundary=b')
      .send('--b\r\nContent-Disposition: form-data; name="file"; filename="a.csv"\r\n\r\n1,2\r\n3,4')
      .expect(400);
    expect(cut.body.detail).toContain('Send the file again');
    expect(await spooled()).toEqual([]);
  });

  it('refuses a wrong digest with 400 and keeps neither row nor object nor temporary file', async () => {
    const bytes = trace();
    const answer = await send(chemist, `?fraction=${fraction.code}`, bytes)
      .set('Content-Digest', digestOf(Buffer.from('other bytes')))
      .expect(400);
    expect(answer.body.title).toBe('The bytes do not match their digest');
    expect(await EvidenceFile.count({ where: { sha256: sha256(bytes) } })).toBe(0);
    expect(await findObjectByteLength(objectKeyFor(sha256(bytes)))).toBeNull();
    await send(chemist, `?fraction=${fraction.code}`, bytes).set('Content-Digest', 'md5=:AAAA:').expect(400);
    await send(chemist, `?fraction=${fraction.code}`, bytes)
      .set('Content-Digest', digestOf(bytes))
      .expect(201);
    expect(await spooled()).toEqual([]);
  });

  it('says what was found when it is no photo, trace or document, whatever the name says', async () => {
    const program = Buffer.concat([Buffer.from('MZ'), Buffer.alloc(500)]);
    const exe = await send(chemist, `?fraction=${fraction.code}`, program, 'plate.jpg').expect(415);
    expect(exe.body.detail).toContain('application/x-msdownload');
    const gif = Buffer.from('R0lGODlhAQABAAAAACH5BAEKAAEALAAAAAABAAEAAAICTAEAOw==', 'base64');
    await send(chemist, `?fraction=${fraction.code}`, gif, 'plate.gif').expect(415);
    const svg = Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>');
    await send(chemist, `?fraction=${fraction.code}`, svg, 'plate.svg').expect(415);
    const avif = Buffer.concat([Buffer.from([0, 0, 0, 24]), Buffer.from('ftypavif\0\0\0\0avifmif1')]);
    const phone = await send(chemist, `?fraction=${fraction.code}`, avif, 'IMG_1.AVIF').expect(415);
    expect(phone.body.detail).toContain('JPEG or HEIC');
  });

  it('refuses a kind that the bytes contradict, and an empty file', async () => {
    const answer = await send(chemist, `?fraction=${fraction.code}&kind=plate-photo`, trace()).expect(422);
    expect(answer.body.errors[0].path).toBe('kind');
    await send(chemist, `?fraction=${fraction.code}`, Buffer.alloc(0)).expect(422);
  });

  it('knows documents and the formats of traces from their bytes', async () => {
    const typeOf = async (bytes: Buffer, kind = '') =>
      (await send(chemist, `?fraction=${fraction.code}${kind}`, bytes).expect(201)).body.evidence;
    const salt = randomBytes(6).toString('hex');
    expect(await typeOf(Buffer.from(`%PDF-1.7\n% ${salt}\n`))).toMatchObject({
      mediaType: 'application/pdf',
      kind: 'document',
    });
    expect(await typeOf(Buffer.from(`##TITLE= ${salt}\n##JCAMP-DX= 5.01\n`))).toMatchObject({
      mediaType: 'chemical/x-jcamp-dx',
      kind: 'gc-trace',
    });
    expect(await typeOf(Buffer.concat([Buffer.from('CDF\x01', 'latin1'), randomBytes(60)]))).toMatchObject({
      mediaType: 'application/x-netcdf',
      kind: 'gc-trace',
    });
    expect(await typeOf(Buffer.from(`Smelled of pears ${salt}.\n`))).toMatchObject({
      mediaType: 'text/plain',
      kind: 'document',
    });
    expect(await typeOf(trace(), '&kind=document')).toMatchObject({
      mediaType: 'text/csv',
      kind: 'document',
    });
  });

  it('refuses a photo that is cut off and one that unfolds to too many pixels, and says what to do', async () => {
    const half = photo.subarray(0, Math.floor(photo.length / 2));
    const answer = await send(chemist, `?fraction=${fraction.code}`, half, 'half.jpg').expect(422);
    expect(answer.body.detail).toContain('Take it again');
    expect(await EvidenceFile.count({ where: { sha256: sha256(half) } })).toBe(0);
    const vast = await sharp({ create: { width: 12_000, height: 8_000, channels: 3, background: '#fff' } })
      .png({ compressionLevel: 9 })
      .toBuffer();
    const bomb = await send(chemist, `?fraction=${fraction.code}`, vast, 'vast.png').expect(422);
    expect(bomb.body.detail).toContain('96 megapixels');
  });

  it('keeps the size as shown after EXIF orientation', async () => {
    const { jpeg } = await drawPlatePhoto({ widthPx: 300, heightPx: 200, orientation: 6 });
    const { body } = await send(chemist, `?fraction=${fraction.code}`, jpeg, 'turned.jpg').expect(201);
    expect(body.evidence).toMatchObject({ widthPx: 200, heightPx: 300 });
    const preview = await chemist
      .get(`${path}/${body.evidence.id}/preview?width=128`)
      .buffer(true)
      .parse(asBytes);
    expect(await sharp(preview.body).metadata()).toMatchObject({ width: 128, height: 192 });
  });

  it('lets nobody send to what they cannot see, nor without the role', async () => {
    const other = await buildFraction();
    await send(chemist, `?fraction=${other.code}`, trace()).expect(404);
    await send(chemist, '?fraction=D-0000-0000-F1', trace()).expect(404);
    await send(chemist, '', trace()).expect(422);
    await send(chemist, `?fraction=${fraction.code}&run=${(await buildRun({ group })).code}`, trace()).expect(
      422,
    );
    const pi = await buildUser({ group, roles: ['pi'] });
    const reader = await signedIn({ email: pi.email, password: pi.plainPassword });
    await send(reader, `?fraction=${fraction.code}`, trace()).expect(403);
    const narrow = await withToken((await buildToken({ group, scopes: ['readings:write'] })).token);
    await send(narrow, `?fraction=${fraction.code}`, trace()).expect(403);
    await chemist.post(`${path}?fraction=${fraction.code}&colour=red`).expect(400);
    await chemist
      .post(`${path}?fraction=${fraction.code}`)
      .set('Content-Type', 'text/csv')
      .send('1,2')
      .expect(400);
  });

  it('keeps a file for the whole run once', async () => {
    const bytes = trace();
    const { code } = await buildRun({ group });
    const first = await send(chemist, `?run=${code}`, bytes).expect(201);
    expect(first.body.evidence).toMatchObject({ run: code, fraction: null });
    const again = await send(chemist, `?run=${code}`, bytes).expect(200);
    expect(again.body.evidence.id).toBe(first.body.evidence.id);
  });

  it('supersedes the signature of a signed-off fraction when evidence is added', async () => {
    const signed = await buildFraction({ run: await buildRun({ group }), status: 'signed off' });
    await send(chemist, `?fraction=${signed.code}`, trace()).expect(201);
    expect((await Fraction.findByPk(signed.id))?.status).toBe('reopened');
  });
});

describe('an instrument PC', () => {
  it('never loses a file: what it cannot place waits in the tray, once', async () => {
    const bytes = trace();
    const first = await send(token, '?fraction=D-0000-0000-F9', bytes, 'gc.csv').expect(202);
    expect(first.body.tray.reason).toContain('D-0000-0000-F9');
    const again = await send(token, '?fraction=D-0000-0000-F9', bytes, 'gc.csv').expect(202);
    expect(again.body.tray.id).toBe(first.body.tray.id);
    expect((await TrayItem.findByPk(first.body.tray.id))?.askedFor).toBe('D-0000-0000-F9');
    await send(token, '', trace()).expect(202);
    await send(token, `?fraction=${(await buildFraction()).code}`, trace()).expect(202);
  });

  it('may try again with the same Idempotency-Key, but not send other bytes under it', async () => {
    const bytes = trace();
    const key = randomBytes(8).toString('hex');
    const post = (content: Buffer) =>
      send(token, `?fraction=${fraction.code}`, content, 'gc.csv').set('Idempotency-Key', key);
    const first = await post(bytes).expect(201);
    const again = await post(bytes).expect(201);
    expect(again.body).toEqual(first.body);
    expect(again.headers['idempotent-replay']).toBe('true');
    await post(trace()).expect(422);
  });
});

describe('reading evidence', () => {
  let id: string;
  beforeAll(async () => {
    const { jpeg } = await drawPlatePhoto({ gps: true });
    photo = Buffer.concat([jpeg, randomBytes(16)]);
    const { body } = await send(chemist, `?fraction=${fraction.code}`, photo, 'Platte "1" α.jpg').expect(201);
    id = body.evidence.id;
  });
  // Not fetch: the server of the same process has put its own in the place of the global one.
  const openContent = async (of: string): Promise<IncomingMessage> => {
    const { url } = await testServer();
    const cookie = chemist.jar
      .getCookies({ domain: '127.0.0.1', path: '/', secure: false, script: false })
      .toValueString();
    const headers = { cookie };
    return new Promise((resolve, reject) => {
      get(`${url}${path}/${of}/content`, { headers }, resolve).on('error', reject);
    });
  };
  const content = () => chemist.get(`${path}/${id}/content`);

  it('gives back the original bytes under their digest as entity tag', async () => {
    const answer = await content().buffer(true).parse(asBytes).expect(200);
    expect(sha256(answer.body)).toBe(sha256(photo));
    expect(answer.headers.etag).toBe(`"${sha256(photo)}"`);
    expect(answer.headers['x-content-type-options']).toBe('nosniff');
    expect(answer.headers['cache-control']).toContain('private');
    expect(answer.headers['cache-control']).toContain('immutable');
    expect(answer.headers['content-disposition']).toContain("filename*=UTF-8''Platte%20%221%22%20%CE%B1.jpg");
    await content()
      .set('If-None-Match', `"${sha256(photo)}"`)
      .expect(304);
  });

  it('gives ranges, and says when one cannot be', async () => {
    const part = await content().set('Range', 'bytes=10-19').buffer(true).parse(asBytes).expect(206);
    expect(part.body.equals(photo.subarray(10, 20))).toBe(true);
    expect(part.headers['content-range']).toBe(`bytes 10-19/${photo.length}`);
    const tail = await content().set('Range', 'bytes=-7').buffer(true).parse(asBytes).expect(206);
    expect(tail.body.equals(photo.subarray(-7))).toBe(true);
    const beyond = await content().set('Range', `bytes=${photo.length}-`).expect(416);
    expect(beyond.headers['content-range']).toBe(`bytes */${photo.length}`);
    const stale = await content()
      .set('Range', 'bytes=0-1')
      .set('If-Range', '"old"')
      .buffer(true)
      .parse(asBytes);
    expect(stale.status).toBe(200);
  });

  it('makes previews of few widths without EXIF, place or any other metadata', async () => {
    expect(photo.includes('Invented Camera Works')).toBe(true);
    expect((await sharp(photo).metadata()).exif?.length).toBeGreaterThan(100);
    const answer = await chemist
      .get(`${path}/${id}/preview?width=200`)
      .buffer(true)
      .parse(asBytes)
      .expect(200);
    const made = await sharp(answer.body).metadata();
    expect(made).toMatchObject({ format: 'webp', width: 256 });
    expect(made.exif ?? made.xmp ?? made.iptc ?? made.icc).toBeUndefined();
    expect(answer.body.includes('Invented Camera Works')).toBe(false);
    expect(answer.body.includes('EXIF')).toBe(false);
    await chemist
      .get(`${path}/${id}/preview?width=256`)
      .set('If-None-Match', answer.headers.etag!)
      .expect(304);
    await chemist.get(`${path}/${id}/preview?width=20000`).expect(400);
    const { body } = await send(chemist, `?fraction=${fraction.code}`, trace());
    await chemist.get(`${path}/${body.evidence.id}/preview`).expect(404);
  });

  it('is a 404 for people of other groups and for ids that are none', async () => {
    const stranger = await buildUser({ group: await buildGroup(), roles: ['pi', 'chemist', 'analyst'] });
    const agent = await signedIn({ email: stranger.email, password: stranger.plainPassword });
    for (const at of ['', '/content', '/preview']) await agent.get(`${path}/${id}${at}`).expect(404);
    await chemist.get(`${path}/not-an-id/content`).expect(404);
  });

  it('ends a damaged file in an error, never as if it were complete', async () => {
    const bytes = Buffer.concat([trace(), Buffer.alloc(300_000, 'x')]);
    const { body } = await send(chemist, `?fraction=${fraction.code}`, bytes).expect(201);
    const store = objectStore();
    const damaged = Buffer.from(bytes);
    damaged[bytes.length - 3] = 0x79;
    await store.client.send(
      new PutObjectCommand({ Bucket: store.bucket, Key: objectKeyFor(sha256(bytes)), Body: damaged }),
    );
    const answer = await openContent(body.evidence.id);
    expect(answer.statusCode).toBe(200);
    await expect(buffer(answer)).rejects.toThrow('aborted');
  });

  it('survives a reader who goes away in the middle', async () => {
    const bytes = Buffer.concat([trace(), Buffer.alloc(8_000_000, 'y')]);
    const { body } = await send(chemist, `?fraction=${fraction.code}`, bytes).expect(201);
    const answer = await openContent(body.evidence.id);
    await once(answer, 'data');
    answer.destroy();
    expect(sha256(await buffer(await openContent(body.evidence.id)))).toBe(sha256(bytes));
  });

  it('gives nothing to a token, which only sends', async () => {
    const { body } = await send(token, `?fraction=${fraction.code}`, trace()).expect(201);
    for (const at of ['', '/content', '/preview'])
      await token.get(`${path}/${body.evidence.id}${at}`).expect(403);
  });
});
