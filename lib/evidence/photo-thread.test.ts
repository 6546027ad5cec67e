import { readFileSync } from 'node:fs';
import sharp from 'sharp';
import { monitorEventLoopDelay } from 'node:perf_hooks';
import { afterAll, describe, expect, it } from 'vitest';
import { photoJob, stopPhotoThread } from './photo-thread';

const heic = readFileSync('tests/fixtures/plate.heic');
const toJpeg = (bytes: Uint8Array, timeLimitMs?: number) =>
  photoJob<'heic to jpeg'>({ kind: 'heic to jpeg', bytes }, timeLimitMs ? { timeLimitMs } : {});

/** The same file with another size in its image spatial extents (ispe, ISO/IEC 23008-12, 6.5.3). */
function withSize(width: number, height: number): Buffer {
  const bytes = Buffer.from(heic);
  const at = bytes.indexOf('ispe', 0, 'latin1');
  bytes.writeUInt32BE(width, at + 8);
  bytes.writeUInt32BE(height, at + 12);
  return bytes;
}

describe('the thread for photos', () => {
  afterAll(stopPhotoThread);

  it('decodes HEIC to a JPEG of the same size without metadata', async () => {
    const { jpeg, width, height } = await toJpeg(heic);
    expect([width, height]).toEqual([400, 600]);
    const meta = await sharp(jpeg).metadata();
    expect([meta.format, meta.width, meta.height, meta.exif]).toEqual(['jpeg', 400, 600, undefined]);
  });

  it('refuses a HEIC photo that claims too many pixels, before they are decoded', async () => {
    await expect(toJpeg(withSize(9000, 6000))).rejects.toMatchObject({
      status: 422,
      detail: expect.stringContaining('54 megapixels'),
    });
  });

  it('says what to do with a damaged one', async () => {
    await expect(toJpeg(heic.subarray(0, 1800))).rejects.toMatchObject({
      status: 422,
      detail: expect.stringContaining('damaged'),
    });
    await expect(toJpeg(Buffer.from('no photo at all'))).rejects.toMatchObject({ status: 422 });
  });

  it('gives up after the time limit, and works again afterwards', async () => {
    await expect(toJpeg(heic, 1)).rejects.toMatchObject({ status: 503 });
    expect((await toJpeg(heic)).width).toBe(400);
  });

  it('does jobs one after the other, turns away too many, and leaves the event loop free', async () => {
    const delay = monitorEventLoopDelay({ resolution: 1 });
    delay.enable();
    const asked = await Promise.allSettled(Array.from({ length: 15 }, () => toJpeg(heic)));
    delay.disable();
    expect(asked.filter((one) => one.status === 'fulfilled')).toHaveLength(12);
    const refused = asked.find((one) => one.status === 'rejected');
    expect(refused?.reason).toMatchObject({ code: 'too-many' });
    process.stdout.write(
      `Event loop delay beside 12 HEIC photos, p99 ${(delay.percentile(99) / 1e6).toFixed(1)} ms\n`,
    );
    expect(delay.percentile(99) / 1e6).toBeLessThan(100);
  });
});
