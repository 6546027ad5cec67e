import { describe, expect, it } from 'vitest';
import { buildEmgTrace, type EmgPeak } from '@/tests/factories/emg-trace';
import { integrate } from './integrate';
import type { Integration } from './integration';

const emg = (atMin: number, areaUnits: number, sigmaMin = 0.02, tauMin = 0.02): EmgPeak => ({
  atMin,
  areaUnits,
  sigmaMin,
  tauMin,
});

/** The measured peak nearest to where the true one has its top. */
function measured(result: Integration, truth: EmgPeak) {
  const expected = truth.atMin + 0.6 * (truth.tauMin ?? 0);
  const hit = result.peaks.find((peak) => Math.abs(peak.retentionTimeMin - expected) < 1.5 * truth.sigmaMin);
  if (!hit)
    throw new Error(`no peak at ${expected} min among ${result.peaks.map((p) => p.retentionTimeMin)}`);
  return hit;
}

const trueShare = (peaks: EmgPeak[], peak: EmgPeak) =>
  (100 * peak.areaUnits) / peaks.reduce((sum, one) => sum + one.areaUnits, 0);

const resolved = [emg(2, 1), emg(4, 10), emg(5, 0.1), emg(7, 100), emg(9, 1)];

// Truths: sums of exponentially modified Gaussians, whose areas are known exactly by construction.
describe('areas of traces with exactly known areas', () => {
  it.each([
    ['level baseline', {}],
    ['offset and falling drift', { offset: 50, driftPerMin: -3 }],
    ['offset and rising drift', { offset: -20, driftPerMin: 7 }],
  ])('area % of an exact trace is within 0.1 absolute: %s', (name, background) => {
    const result = integrate(
      buildEmgTrace({ peaks: resolved, durationMin: 12, pointCount: 7201, ...background }),
    );
    expect(result.peaks).toHaveLength(resolved.length);
    let worst = 0;
    for (const peak of resolved) {
      worst = Math.max(worst, Math.abs(measured(result, peak).areaPercent - trueShare(resolved, peak)));
    }
    process.stdout.write(`${name}: worst area % error ${worst.toExponential(1)} absolute\n`);
    expect(worst).toBeLessThan(0.1);
  });

  it.each([
    ['500 points', 500, 0.06],
    ['3,000 points', 3000, 0.03],
    ['20,000 points', 20_000, 0.02],
    ['200,000 points', 200_000, 0.02],
  ])('resolved peaks are within 0.1 %% of their area at S/N over 1000: %s', (name, pointCount, sigma) => {
    const peaks = [emg(2, 8, sigma, sigma), emg(4.5, 10, sigma, sigma / 2), emg(7.5, 12, sigma, 1.5 * sigma)];
    const height = 8 / (sigma * 3.2);
    const noise = height / 15_000;
    const trace = buildEmgTrace({ peaks, durationMin: 11, pointCount, offset: 5, driftPerMin: 0.4, noise });
    const result = integrate(trace);
    let worst = 0;
    for (const peak of peaks) {
      const found = measured(result, peak);
      expect(found.signalToNoise).toBeGreaterThan(1000);
      worst = Math.max(worst, Math.abs(found.area / peak.areaUnits - 1));
    }
    process.stdout.write(`${name}: worst area error ${(100 * worst).toFixed(4)} %\n`);
    expect(worst).toBeLessThan(0.001);
  });

  it.each([0.3, 0.35, 0.4, 0.5, 0.6])(
    'a 0.05 %% impurity %f min behind the main peak, on its tail, is found within 10 %% of its area',
    (distance) => {
      const main = emg(5, 100, 0.02, 0.03);
      const impurity = emg(5 + distance, 0.05, 0.02, 0.03);
      for (const noise of [0, 0.003, 0.01]) {
        const peaks = [main, impurity];
        const trace = buildEmgTrace({
          peaks,
          durationMin: 10,
          pointCount: 6001,
          noise,
          driftPerMin: 0.5,
          offset: 3,
        });
        const result = integrate(trace);
        expect(result.peaks).toHaveLength(2);
        const error = measured(result, impurity).area / impurity.areaUnits - 1;
        process.stdout.write(
          `impurity at +${distance} min, noise ${noise}: area error ${(100 * error).toFixed(2)} %\n`,
        );
        expect(Math.abs(error)).toBeLessThan(0.1);
        expect(measured(result, main).area / main.areaUnits).toBeCloseTo(1, 3);
      }
    },
  );

  it('an impurity so deep on the tail that it has no maximum of its own is skimmed and called a shoulder', () => {
    const impurity = emg(5.25, 0.05, 0.02, 0.03);
    const result = integrate(
      buildEmgTrace({ peaks: [emg(5, 100, 0.02, 0.03), impurity], durationMin: 10, pointCount: 6001 }),
    );
    const found = measured(result, impurity);
    expect(found.flags).toEqual(expect.arrayContaining(['tangent skimmed', 'shoulder']));
    expect(Math.abs(found.area / impurity.areaUnits - 1)).toBeLessThan(0.1);
    expect(result.peaks[0]!.flags).toContain('carries skimmed peaks');
  });

  it.each([
    ['drift', { driftPerMin: 5, offset: 100 }],
    ['noise', { noise: 0.25 }],
    ['noise and drift', { noise: 0.25, driftPerMin: -5 }],
    ['column bleed', { noise: 0.05, bleed: (t: number) => 20 / (1 + Math.exp(-(t - 9) / 1.5)) }],
  ])('%s changes the area %% of a 1 %% peak by less than 0.02 absolute', (name, background) => {
    const minor = emg(8, 1);
    const peaks = [emg(5, 99), minor];
    const clean = integrate(buildEmgTrace({ peaks, durationMin: 12, pointCount: 7201 }));
    const reference = measured(clean, minor).areaPercent;
    const changes = [1, 2, 3, 4, 5, 6].map((seed) => {
      const result = integrate(
        buildEmgTrace({ peaks, durationMin: 12, pointCount: 7201, seed, ...background }),
      );
      return Math.abs(measured(result, minor).areaPercent - reference);
    });
    const worst = Math.max(...changes);
    process.stdout.write(`${name}: area % of the 1 % peak changes by at most ${worst.toFixed(4)}\n`);
    expect(worst).toBeLessThan(0.02);
  });

  it('parts overlapping peaks at the valley and loses nothing between them', () => {
    const peaks = [emg(3, 10, 0.02, 0), emg(3.08, 10, 0.02, 0)];
    const result = integrate(buildEmgTrace({ peaks, durationMin: 6, pointCount: 6001, noise: 0.01 }));
    expect(result.peaks).toHaveLength(2);
    expect(result.peaks[0]!.areaPercent).toBeCloseTo(50, 1);
    expect(result.totalArea).toBeCloseTo(20, 2);
    expect(result.peaks[0]!.flags).toContain('not separated from the peak after');
    expect(result.peaks[1]!.flags).toContain('not separated from the peak before');
    // Two Gaussians 4 standard deviations apart: Rs = 1.18 x 4/(2 x 2.3548) = 1.00.
    expect(result.peaks[1]!.resolution).toBeCloseTo(1.0, 1);
  });

  it('reports a shoulder of a comparable peak as one, unless told not to', () => {
    const peaks = [emg(3, 10, 0.03, 0), emg(3.075, 4, 0.03, 0)];
    const trace = buildEmgTrace({ peaks, durationMin: 6, pointCount: 6001, noise: 0.001 });
    const both = integrate(trace);
    expect(both.peaks).toHaveLength(2);
    expect(both.peaks[1]!.flags).toContain('shoulder');
    expect(both.totalArea).toBeCloseTo(14, 2);
    expect(integrate(trace, { reportShoulders: false }).peaks).toHaveLength(1);
  });

  it('finds peaks of 3 and of thousands of points over their half height in one trace', () => {
    const narrow = emg(1, 1, 0.000_65, 0);
    const wide = emg(30, 4000, 1.2, 0);
    const trace = buildEmgTrace({ peaks: [narrow, wide], durationMin: 60, pointCount: 120_001, noise: 0.5 });
    const result = integrate(trace);
    expect(result.peaks).toHaveLength(2);
    expect(measured(result, narrow).widthHalfMin! * 2000).toBeCloseTo(3.06, 0);
    expect(measured(result, narrow).flags).toContain('few points');
    expect(measured(result, narrow).area).toBeCloseTo(1, 1);
    expect(measured(result, wide).area / 4000).toBeCloseTo(1, 2);
  });
});
