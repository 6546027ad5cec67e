import { describe, expect, it } from 'vitest';
import { layoutSmallChromatogram, placePeakNumbers } from './small-chromatogram-layout';

const gauss = (t: number, at: number, height: number) => height * Math.exp(-((t - at) ** 2) / 0.02);
const timeMin = Array.from({ length: 601 }, (_, k) => k / 100);
const trace = (noise: number) => ({
  timeMin,
  signal: timeMin.map((t, k) => gauss(t, 2, 1000) + gauss(t, 4, 5) + noise * (k % 2 ? 1 : -1)),
});

describe('the small chromatogram', () => {
  it('reaches from side to side and from the foot to the top', () => {
    const { signalPath, startMin, endMin } = layoutSmallChromatogram(trace(0.01));
    expect(signalPath.startsWith('M0.0 96.0')).toBe(true);
    expect(signalPath).toContain('L333.3 4.0');
    expect(signalPath).toContain('L1000.0');
    expect([startMin, endMin]).toEqual([0, 6]);
  });

  it('enlarges a quiet trace a hundred times, so that half a per cent stands out', () => {
    const { enlargement, enlargedPath } = layoutSmallChromatogram(trace(0.01));
    expect(enlargement).toBe(100);
    // 5 of 1000, a hundred times: half of the 92 between foot and top.
    const height = Number(/L666\.7 (\d+\.\d)/.exec(enlargedPath!)![1]);
    expect(height).toBeGreaterThan(45);
    expect(height).toBeLessThan(55);
  });

  it('enlarges a noisy trace less, and a very noisy one not at all', () => {
    expect(layoutSmallChromatogram(trace(1)).enlargement).toBe(20);
    expect(layoutSmallChromatogram(trace(20)).enlargement).toBeNull();
  });

  it('draws a level line without a division by zero', () => {
    const flat = layoutSmallChromatogram({ timeMin: [0, 1], signal: [3, 3] });
    expect(flat.signalPath).toBe('M0.0 50.0L1000.0 50.0');
    expect(flat.enlargedPath).toBeNull();
  });
});

describe('the numbers of the peaks', () => {
  const peaks = [
    { number: 1, retentionTimeMin: 2, areaPercent: 99 },
    { number: 2, retentionTimeMin: 2.1, areaPercent: 0.4 },
    { number: 3, retentionTimeMin: 4, areaPercent: 0.6 },
    { number: 4, retentionTimeMin: 9, areaPercent: 0.1 },
  ];

  it('gives the room to the larger peak and leaves out what lies outside', () => {
    expect(placePeakNumbers(peaks, { startMin: 0, endMin: 5 })).toEqual([
      { number: 1, leftPercent: 40, written: true },
      { number: 2, leftPercent: 42, written: false },
      { number: 3, leftPercent: 80, written: true },
    ]);
  });
});
