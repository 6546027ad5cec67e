import sharp from 'sharp';
import { describe, expect, test } from 'vitest';
import { drawPlatePhoto } from '@/tests/factories/plate-photo';
import { judge, newTally } from '@/tests/factories/plate-renderer/compare';
import { plateCase, renderCase } from '@/tests/factories/plate-renderer/plate-set';
import { troubles } from '@/tests/factories/plate-renderer/troubles';
import { suggestPlate } from './suggest-plate';

async function pixelsOf(jpeg: Buffer) {
  const { data, info } = await sharp(jpeg)
    .autoOrient()
    .removeAlpha()
    .raw()
    .toBuffer({ resolveWithObject: true });
  return { data, width: info.width, height: info.height };
}

/** Cases of the set with which the method was not tuned. */
const FIRST = 700;
const PLATES = 66;

describe('the suggestion for a plate, accepted as it stands', () => {
  test('meets its goals over 66 rendered photos', { timeout: 180_000 }, async () => {
    const tally = newTally();
    const lines: string[] = [];
    for (let index = FIRST; index < FIRST + PLATES; index += 1) {
      const one = plateCase(index, 1000);
      const { jpeg, truth } = await renderCase(one);
      const notes = judge(suggestPlate(await pixelsOf(jpeg)), truth, one.scene, tally);
      if (notes.length > 0) lines.push(`  ${one.name}: ${notes.join('; ')}`);
    }
    const corners = [...tally.cornerErrorsMm].sort((a, b) => a - b);
    process.stdout.write(
      [
        `Suggestion on ${tally.plates} rendered plates (${tally.blankPlates} blank):`,
        `  spots above the noise found: ${tally.found} of ${tally.spotsAboveNoise} (${((100 * tally.found) / tally.spotsAboveNoise).toFixed(1)} %)`,
        `  Rf within 0.01 of the truth: ${tally.rfWithinHundredth} of ${tally.found} found (${((100 * tally.rfWithinHundredth) / tally.found).toFixed(1)} %), largest error ${tally.largestRfError.toFixed(4)}`,
        `  false spots: ${tally.falseSpots} (${((10 * tally.falseSpots) / tally.plates).toFixed(2)} in ten plates), on blank plates ${tally.falseOnBlank}`,
        `  lanes found: ${tally.lanesFound} of ${tally.lanes}, false lanes ${tally.falseLanes}`,
        `  corners: median error ${corners[corners.length >> 1]!.toFixed(2)} mm, 95 % within ${corners[Math.floor(0.95 * corners.length)]!.toFixed(2)} mm`,
        ...lines,
      ].join('\n') + '\n',
    );
    expect(tally.spotsAboveNoise).toBeGreaterThan(400);
    expect(tally.blankPlates).toBeGreaterThanOrEqual(10);
    expect(tally.found / tally.spotsAboveNoise).toBeGreaterThanOrEqual(0.95);
    expect(tally.rfWithinHundredth / tally.found).toBeGreaterThanOrEqual(0.95);
    expect(tally.falseSpots / tally.plates).toBeLessThanOrEqual(0.1);
    expect(tally.falseOnBlank).toBe(0);
    expect(tally.lanesFound / tally.lanes).toBeGreaterThanOrEqual(0.95);
  });

  test.each(troubles)('bears a %s', { timeout: 60_000 }, async (trouble) => {
    const tally = newTally();
    for (let index = 500; index < 506; index += 1) {
      const one = plateCase(index, 900);
      one.scene.troubles = [trouble];
      const { jpeg, truth } = await renderCase(one);
      judge(suggestPlate(await pixelsOf(jpeg)), truth, one.scene, tally);
    }
    process.stdout.write(
      `With a ${trouble}: ${tally.found} of ${tally.spotsAboveNoise} spots found, Rf within 0.01 for ${tally.rfWithinHundredth}, false spots ${tally.falseSpots}, worst corner ${Math.max(...tally.cornerErrorsMm).toFixed(2)} mm\n`,
    );
    expect(tally.found / tally.spotsAboveNoise).toBeGreaterThanOrEqual(0.95);
    expect(tally.rfWithinHundredth / tally.found).toBeGreaterThanOrEqual(0.95);
    expect(tally.falseSpots).toBeLessThanOrEqual(1);
  });

  test.each([90, 270])('turns a plate that lies on its side, by %i degrees', async (degrees) => {
    const one = plateCase(0, 800);
    const { jpeg, truth } = await renderCase(one);
    const turned = await sharp(jpeg).rotate(degrees).toBuffer();
    const suggestion = suggestPlate(await pixelsOf(turned));
    expect(suggestion.reasons.join(' ')).toContain('on its side');
    // Clockwise by a quarter: (x, y) of the upright photo goes to (height - y, x).
    const turn = (p: { x: number; y: number }) =>
      degrees === 90 ? { ...p, x: truth.height - p.y, y: p.x } : { ...p, x: p.y, y: truth.width - p.x };
    const asTurned = {
      ...truth,
      corners: truth.corners.map(turn),
      lanes: truth.lanes.map((lane) => ({ ...turn(lane), spots: lane.spots.map(turn) as typeof lane.spots })),
    };
    const tally = newTally();
    judge(suggestion, asTurned, one.scene, tally);
    expect(tally.rfWithinHundredth).toBe(tally.spotsAboveNoise);
    expect(tally.falseSpots).toBe(0);
  });

  test('does not take lines drawn from border to border for edges of the plate', async () => {
    const drawn = await drawPlatePhoto();
    const suggestion = suggestPlate(await pixelsOf(drawn.jpeg));
    expect(suggestion.corners[2]).toEqual({ x: drawn.widthPx, y: drawn.heightPx });
    // The line is drawn over the rows from y - 1 to y + 1, whose middle lies at y + 0.5.
    expect(Math.abs(suggestion.baseline[0]!.y - drawn.baselineY - 0.5)).toBeLessThan(1);
    expect(Math.abs(suggestion.front[0]!.y - drawn.frontY - 0.5)).toBeLessThan(1);
    expect(suggestion.lanes.map((lane) => lane.spots.length)).toEqual([1, 2]);
    expect(suggestion.lanes[0]!.spots[0]!.rf).toBeCloseTo(0.44, 2);
  });

  test('invents no front: spots are proposed without Rf, and the front is asked for', async () => {
    const one = plateCase(0, 800);
    one.scene.noFrontLine = true;
    const { jpeg, truth } = await renderCase(one);
    const suggestion = suggestPlate(await pixelsOf(jpeg));
    expect(suggestion.front).toEqual([]);
    expect(suggestion.baseline).toHaveLength(2);
    expect(suggestion.reasons).toContain('No solvent front is seen: draw it.');
    const spots = suggestion.lanes.flatMap((lane) => lane.spots);
    expect(spots).toHaveLength(truth.lanes.flatMap((lane) => lane.spots).length);
    expect(spots.every((spot) => spot.rf === null)).toBe(true);
  });

  test('says what it does not see on a photo without a plate', () => {
    const [width, height] = [300, 400];
    const data = new Uint8Array(width * height * 3).fill(120);
    const suggestion = suggestPlate({ data, width, height });
    expect(suggestion.lanes.flatMap((lane) => lane.spots)).toEqual([]);
    expect(suggestion.baseline).toEqual([]);
    expect(suggestion.front).toEqual([]);
    expect(suggestion.confidence).toBeLessThan(0.2);
    expect(suggestion.reasons.join(' ')).toMatch(/baseline.*front/);
  });

  test('refuses a photo too small to look at', () => {
    expect(() => suggestPlate({ data: new Uint8Array(20 * 20 * 3), width: 20, height: 20 })).toThrow(
      RangeError,
    );
  });

  test('gives a wider share of the lane to the stronger of two spots of a size', async () => {
    const one = plateCase(0, 800);
    const spots = [
      { rf: 0.3, sigmaMm: 1.4, strength: 0.6 },
      { rf: 0.7, sigmaMm: 1.4, strength: 0.2 },
    ];
    one.scene.lanes = [{ xMm: 25, spots }];
    const { jpeg } = await renderCase(one);
    const found = suggestPlate(await pixelsOf(jpeg)).lanes.flatMap((lane) => lane.spots);
    expect(found).toHaveLength(2);
    const [faint, strong] = found;
    expect(strong!.rf).toBeCloseTo(0.3, 2);
    expect(faint!.rf).toBeCloseTo(0.7, 2);
    expect(strong!.relativeIntensity + faint!.relativeIntensity).toBeCloseTo(1, 6);
    // Light lost goes by the logarithm: -ln(1 - 0.6 a) against -ln(1 - 0.2 a), a little over three to one.
    expect(strong!.relativeIntensity / faint!.relativeIntensity).toBeGreaterThan(3);
    expect(strong!.relativeIntensity / faint!.relativeIntensity).toBeLessThan(5);
  });

  test('flags a spot that trails a streak, at the place of its centre', async () => {
    const one = plateCase(0, 800);
    one.scene.lanes = [
      { xMm: 17, spots: [{ rf: 0.6, sigmaMm: 1.3, strength: 0.7, tailMm: 6 }] },
      { xMm: 34, spots: [{ rf: 0.5, sigmaMm: 1.3, strength: 0.7 }] },
    ];
    const { jpeg } = await renderCase(one);
    const found = suggestPlate(await pixelsOf(jpeg)).lanes.flatMap((lane) => lane.spots);
    expect(found.map((spot) => spot.shape)).toEqual(['streak', 'spot']);
    expect(Math.abs(found[0]!.rf! - 0.6)).toBeLessThan(0.015);
  });
});
