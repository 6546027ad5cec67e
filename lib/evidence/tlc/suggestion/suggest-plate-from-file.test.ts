import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { judge, newTally } from '@/tests/factories/plate-renderer/compare';
import { plateCase, renderCase, type PlateCase } from '@/tests/factories/plate-renderer/plate-set';
import type { RenderedPlate } from '@/tests/factories/plate-renderer/render-plate';
import { prepareSuggestions, stopSuggestions, suggestPlateFromFile } from './suggest-plate-from-file';

describe('the suggestion for a photo of 12 megapixels', () => {
  const photos: { one: PlateCase; photo: RenderedPlate }[] = [];

  beforeAll(async () => {
    // Green ground on its side, a stain that trails, 25 narrow lanes; with the grain that a phone leaves.
    for (const index of [6, 3, 40]) {
      const one = plateCase(index, 4032);
      one.exposure.noise = 4;
      photos.push({ one, photo: await renderCase(one) });
    }
  }, 120_000);
  afterAll(stopSuggestions);

  test('meets the same goals in places of the whole photo as shown', { timeout: 60_000 }, async () => {
    const tally = newTally();
    for (const { one, photo } of photos) {
      expect(photo.truth.width * photo.truth.height).toBeGreaterThan(12e6);
      const notes = judge(await suggestPlateFromFile(photo.jpeg), photo.truth, one.scene, tally);
      if (notes.length > 0)
        process.stdout.write(`12 MP, ${one.name}, orientation ${one.orientation}: ${notes.join('; ')}\n`);
    }
    process.stdout.write(
      `Suggestion on ${tally.plates} photos of 12 MP: ${tally.found} of ${tally.spotsAboveNoise} spots found, Rf within 0.01 for ${tally.rfWithinHundredth}, largest error ${tally.largestRfError.toFixed(4)}, false spots ${tally.falseSpots}\n`,
    );
    expect(tally.spotsAboveNoise).toBeGreaterThan(40);
    expect(tally.found / tally.spotsAboveNoise).toBeGreaterThanOrEqual(0.95);
    expect(tally.rfWithinHundredth / tally.found).toBeGreaterThanOrEqual(0.95);
    expect(tally.falseSpots).toBe(0);
  });

  test('gives up after the time limit and works again afterwards', { timeout: 60_000 }, async () => {
    const { jpeg, truth } = photos[0]!.photo;
    await expect(suggestPlateFromFile(jpeg, { timeLimitMs: 1 })).rejects.toMatchObject({
      code: 'unavailable',
      detail: expect.stringContaining('by hand'),
    });
    const again = await suggestPlateFromFile(jpeg);
    expect(Math.abs(again.corners[0]!.x - truth.corners[0]!.x)).toBeLessThan(8);
  });

  test('finds the same from a thread that was started and warmed up ahead', { timeout: 60_000 }, async () => {
    const { jpeg } = photos[0]!.photo;
    const before = await suggestPlateFromFile(jpeg);
    await stopSuggestions();
    prepareSuggestions();
    expect(await suggestPlateFromFile(jpeg)).toEqual(before);
  });

  test('says what to do with a damaged photo', async () => {
    const half = photos[0]!.photo.jpeg.subarray(0, 100_000);
    await expect(suggestPlateFromFile(half)).rejects.toMatchObject({ code: 'invalid', status: 422 });
    await expect(suggestPlateFromFile(Buffer.from('no photo at all'))).rejects.toMatchObject({
      code: 'invalid',
    });
  });

  test('turns away more photos than it can look at in good time', async () => {
    const small = await sharp({ create: { width: 200, height: 300, channels: 3, background: '#456' } })
      .jpeg()
      .toBuffer();
    const asked = await Promise.allSettled(Array.from({ length: 12 }, () => suggestPlateFromFile(small)));
    expect(asked.filter((one) => one.status === 'fulfilled')).toHaveLength(8);
    const refused = asked.find((one) => one.status === 'rejected');
    expect(refused?.reason).toMatchObject({ code: 'too-many', extra: { retryAfterSeconds: 5 } });
  });
});

describe('the EXIF orientation of a photo', () => {
  afterAll(stopSuggestions);

  test.each([1, 2, 3, 4, 5, 6, 7, 8])(
    '%i is obeyed: corners and Rf are those of the photo as shown',
    async (orientation) => {
      const one = { ...plateCase(0, 700), orientation };
      const { jpeg, truth } = await renderCase(one);
      expect((await sharp(jpeg).metadata()).orientation ?? 1).toBe(orientation);
      const suggestion = await suggestPlateFromFile(jpeg);
      truth.corners.forEach((corner, i) => {
        expect(
          Math.hypot(corner.x - suggestion.corners[i]!.x, corner.y - suggestion.corners[i]!.y),
        ).toBeLessThan(2);
      });
      const tally = newTally();
      expect(judge(suggestion, truth, one.scene, tally)).toEqual([]);
    },
  );
});
