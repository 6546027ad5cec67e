import { describe, expect, test } from 'vitest';
import { measureAreas, profileLane } from './lane-profile';
import { newRaster } from './raster';

const lines = {
  baseline: [
    { x: 0, y: 180 },
    { x: 60, y: 180 },
  ],
  front: [
    { x: 0, y: 20 },
    { x: 60, y: 20 },
  ],
};

/** A lane with Gauss-shaped spots at given Rf, on a slope of background. */
function laneWith(spots: { rf: number; height: number }[], slope = 0) {
  const signal = newRaster(60, 200);
  for (let y = 0; y < 200; y += 1)
    for (let x = 0; x < 60; x += 1) {
      let value = slope * y;
      for (const { rf, height } of spots) {
        const centre = 180 - 160 * rf;
        value += height * Math.exp(-((y + 0.5 - centre) ** 2 + (x + 0.5 - 30) ** 2) / (2 * 16));
      }
      signal.data[y * 60 + x] = value;
    }
  return signal;
}

describe('the profile along a lane', () => {
  test('has areas in the ratio of the heights of two spots of one size', () => {
    const profile = profileLane(
      laneWith([
        { rf: 0.3, height: 30 },
        { rf: 0.7, height: 10 },
      ]),
      30,
      12,
      lines,
    )!;
    const areas = measureAreas(profile, [0.3, 0.7]);
    expect(areas[0]!.shareOfLane).toBeCloseTo(0.75, 2);
    expect(areas[1]!.shareOfLane).toBeCloseTo(0.25, 2);
    expect(areas[0]!.fromRf).toBeLessThan(0.25);
    expect(areas[0]!.toRf).toBeGreaterThan(0.35);
  });

  test('area is the integral over Rf: height * sigma * sqrt(2 pi) for one spot averaged over its strip', () => {
    const profile = profileLane(laneWith([{ rf: 0.5, height: 30 }]), 30, 16, lines)!;
    const [one] = measureAreas(profile, [0.5]);
    // Over 33 columns a Gauss function of sigma 4 averages to 4 sqrt(2 pi) / 33; sigma is 4/160 of the way to the front.
    const expected = ((30 * 4 * Math.sqrt(2 * Math.PI)) / 33) * (4 / 160) * Math.sqrt(2 * Math.PI);
    expect(one!.area / expected).toBeGreaterThan(0.97);
    expect(one!.area / expected).toBeLessThan(1.03);
  });

  test('does not mistake a sloping background for substance', () => {
    const flat = profileLane(
      laneWith([
        { rf: 0.3, height: 30 },
        { rf: 0.7, height: 10 },
      ]),
      30,
      12,
      lines,
    )!;
    const sloping = profileLane(
      laneWith(
        [
          { rf: 0.3, height: 30 },
          { rf: 0.7, height: 10 },
        ],
        0.02,
      ),
      30,
      12,
      lines,
    )!;
    const [a] = measureAreas(flat, [0.3, 0.7]);
    const [b] = measureAreas(sloping, [0.3, 0.7]);
    expect(Math.abs(a!.shareOfLane - b!.shareOfLane)).toBeLessThan(0.03);
  });

  test('there is none where baseline and front run together', () => {
    expect(profileLane(laneWith([]), 30, 12, { ...lines, front: lines.baseline })).toBeNull();
  });
});
