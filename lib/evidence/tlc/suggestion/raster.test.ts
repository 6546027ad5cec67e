import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { blur } from './blur';
import { flattenGround } from './flatten-ground';
import { newRaster, reducePhoto, robustSpread, takeMedian } from './raster';

describe('pictures as numbers', () => {
  test('the median by selection is the one by sorting', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -50, max: 50 }), { minLength: 1, maxLength: 60 }), (values) => {
        const sorted = [...values].sort((a, b) => a - b);
        expect(takeMedian(Float32Array.from(values))).toBe(sorted[(sorted.length - 1) >> 1]);
      }),
    );
    expect(takeMedian(new Float32Array(0))).toBeNaN();
  });

  test('the robust spread of a normal sample with a tenth of outliers is near its standard deviation', () => {
    // Quantiles of the standard normal by Acklam's idea are not needed: sums of twelve uniform steps will do.
    let state = 1;
    const uniform = () => (state = (state * 48271) % 2147483647) / 2147483647;
    const values = Float32Array.from({ length: 4000 }, (_, i) => {
      if (i % 10 === 0) return 100;
      return Array.from({ length: 12 }, uniform).reduce((a, b) => a + b, -6);
    });
    expect(robustSpread(values).spread).toBeGreaterThan(0.95);
    expect(robustSpread(values).spread).toBeLessThan(1.25);
  });

  test.each([1.3, 2.7, 5.7, 10])(
    'a blur of sigma %d spreads a point to that variance and loses nothing',
    (sigma) => {
      const point = newRaster(121, 121);
      point.data[60 * 121 + 60] = 1;
      const { data } = blur(point, sigma);
      let [sum, variance] = [0, 0];
      for (let y = 0; y < 121; y += 1)
        for (let x = 0; x < 121; x += 1) {
          sum += data[y * 121 + x]!;
          variance += data[y * 121 + x]! * (x - 60) ** 2;
        }
      expect(sum).toBeCloseTo(1, 4);
      // Whole window widths come within a few per cent (Kovesi 2010, table 1).
      expect(Math.sqrt(variance) / sigma).toBeGreaterThan(0.9);
      expect(Math.sqrt(variance) / sigma).toBeLessThan(1.1);
    },
  );

  test('flattening takes off a slope of light and leaves a spot standing', () => {
    const plate = newRaster(200, 300);
    for (let y = 0; y < 300; y += 1)
      for (let x = 0; x < 200; x += 1) {
        const spot = -0.5 * Math.exp(-((x - 100) ** 2 + (y - 150) ** 2) / (2 * 25));
        plate.data[y * 200 + x] = 5 + 0.002 * x - 0.001 * y + spot;
      }
    const { data } = flattenGround(plate);
    expect(data[150 * 200 + 100]).toBeCloseTo(-0.5, 1);
    expect(Math.abs(data[60 * 200 + 50]!)).toBeLessThan(0.01);
    expect(Math.abs(data[250 * 200 + 150]!)).toBeLessThan(0.01);
  });

  test('reducing takes the mean of blocks', () => {
    const data = Uint8Array.from([10, 0, 0, 20, 0, 0, 30, 0, 0, 40, 0, 0]);
    expect([...reducePhoto({ data, width: 2, height: 2 }, 2).data]).toEqual([25, 0, 0]);
  });
});
