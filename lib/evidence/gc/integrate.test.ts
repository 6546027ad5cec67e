import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { buildEmgTrace, type EmgPeak } from '@/tests/factories/emg-trace';
import { integrate } from './integrate';
import { TraceProblem, type Integration } from './integration';

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

const resolved = [emg(2, 1), emg(4, 10), emg(5, 0.1), emg(7, 100), emg(9, 1)];

describe('what does not belong into the sum', () => {
  it('a flat top is flagged as a saturated detector', () => {
    const { timeMin, signal } = buildEmgTrace({
      peaks: [emg(3, 10), emg(6, 1)],
      durationMin: 9,
      pointCount: 5401,
    });
    const clipped = signal.map((value) => Math.min(value, 100));
    const result = integrate({ timeMin, signal: clipped });
    expect(result.peaks).toHaveLength(2);
    expect(result.peaks[0]!.flags).toContain('detector saturated');
    expect(result.peaks[1]!.flags).not.toContain('detector saturated');
    expect(result.flags).toContain('detector saturated');
  });

  it('a negative dip is reported and does not lessen the areas', () => {
    const dip = emg(5, -2, 0.03, 0);
    const peaks = [emg(3, 10), emg(7, 5)];
    const result = integrate(
      buildEmgTrace({ peaks: [...peaks, dip], durationMin: 10, pointCount: 6001, noise: 0.02 }),
    );
    expect(result.peaks).toHaveLength(2);
    expect(result.negativeDips).toHaveLength(1);
    expect(result.negativeDips[0]!.lowestMin).toBeCloseTo(5, 1);
    expect(result.negativeDips[0]!.area).toBeCloseTo(-2, 1);
    expect(result.flags).toContain('negative dips kept out of the sum');
    expect(result.totalArea).toBeCloseTo(15, 1);
  });

  it('an excluded range is measured, listed with its reason, and not counted', () => {
    const peaks = [emg(1, 1000, 0.03, 0.05), emg(3, 9), emg(5, 1)];
    const trace = buildEmgTrace({ peaks, durationMin: 8, pointCount: 4801, noise: 0.01 });
    const result = integrate(trace, { exclude: [{ fromMin: 0, toMin: 2, reason: 'solvent' }] });
    expect(result.peaks.map((peak) => Math.round(peak.areaPercent))).toEqual([90, 10]);
    expect(result.excludedPeaks).toHaveLength(1);
    expect(result.excludedPeaks[0]).toMatchObject({ reason: 'solvent' });
    expect(result.excludedPeaks[0]!.area / 1000).toBeCloseTo(1, 2);
  });

  it('peaks under the disregard limit leave the sum and are counted', () => {
    const trace = buildEmgTrace({ peaks: resolved, durationMin: 12, pointCount: 7201 });
    const result = integrate(trace, { minimumAreaPercent: 0.5 });
    expect(result.peaks).toHaveLength(4);
    expect(result.disregardedPeakCount).toBe(1);
    expect(result.peaks.reduce((sum, peak) => sum + peak.areaPercent, 0)).toBeCloseTo(100, 10);
  });

  it('a blank that was sampled otherwise is subtracted', () => {
    const ghost = emg(6, 3);
    const bleed = (t: number) => 2 * t;
    const run = buildEmgTrace({ peaks: [emg(4, 10), ghost], durationMin: 10, pointCount: 6001, bleed });
    const blank = buildEmgTrace({ peaks: [ghost], durationMin: 10, pointCount: 9001, bleed });
    const result = integrate(run, { minimumAreaPercent: 0.1 }, blank);
    expect(result.peaks).toHaveLength(1);
    expect(result.peaks[0]!.area).toBeCloseTo(10, 3);
  });

  it('noise alone gives no peak, white or wandering', () => {
    for (let seed = 1; seed <= 8; seed++) {
      const white = buildEmgTrace({ peaks: [], durationMin: 10, pointCount: 20_000, noise: 1, seed });
      expect(integrate(white).peaks).toEqual([]);
      let level = 0;
      const wandering = white.signal.map((value) => (level = 0.99 * level + value));
      expect(integrate({ timeMin: white.timeMin, signal: wandering }).peaks).toEqual([]);
    }
  });

  it('a spike of one point is no peak', () => {
    const { timeMin, signal } = buildEmgTrace({
      peaks: [emg(4, 10)],
      durationMin: 8,
      pointCount: 4801,
      noise: 0.05,
    });
    signal[1000] = 500;
    expect(integrate({ timeMin, signal }).peaks).toHaveLength(1);
  });

  it('a trace in whole converter steps keeps its noise and gets no peak from single steps', () => {
    const { timeMin, signal } = buildEmgTrace({
      peaks: [emg(4, 10)],
      durationMin: 8,
      pointCount: 4801,
      noise: 0.25,
    });
    const stepped = signal.map((value) => Math.round(value));
    const result = integrate({ timeMin, signal: stepped });
    expect(result.noise.quantisationStep).toBe(1);
    expect(result.peaks).toHaveLength(1);
  });
});

describe('traces that hold nothing to integrate', () => {
  const times = (n: number) => Float64Array.from({ length: n }, (_, i) => i / 100);

  it.each([
    ['no point', 0, 'too few points to integrate'],
    ['a single point', 1, 'too few points to integrate'],
    ['nine points', 9, 'too few points to integrate'],
    ['a constant signal', 500, 'the signal is constant'],
  ])('%s gives an empty table and says why', (_, n, flag) => {
    const result = integrate({ timeMin: times(n), signal: new Float64Array(n).fill(3) });
    expect(result.peaks).toEqual([]);
    expect(result.flags).toContain(flag);
  });

  it('a straight drift has no peak', () => {
    const timeMin = times(1000);
    const result = integrate({ timeMin, signal: timeMin.map((t) => 4 - 3 * t) });
    expect(result.peaks).toEqual([]);
    expect(result.flags).toContain('no peak found');
  });

  it('a trace that is negative throughout is integrated over its own baseline', () => {
    const trace = buildEmgTrace({ peaks: [emg(4, 10)], durationMin: 8, pointCount: 4801, offset: -1000 });
    const result = integrate(trace);
    expect(result.peaks).toHaveLength(1);
    expect(result.peaks[0]!.area).toBeCloseTo(10, 3);
  });

  it('a peak that the trace cuts off is flagged', () => {
    const peaks = [emg(0, 10, 0.1, 0), emg(4, 10)];
    const result = integrate(buildEmgTrace({ peaks, durationMin: 8, pointCount: 4801, noise: 0.01 }));
    const late = buildEmgTrace({
      peaks: [emg(4, 10), emg(7.95, 10, 0.1, 0)],
      durationMin: 8,
      pointCount: 4801,
    });
    expect(measured(result, peaks[1]!).area).toBeCloseTo(10, 1);
    expect(integrate(late).peaks[1]!.flags).toContain('cut at the end of the trace');
  });

  it.each([
    ['NaN', 7, Number.NaN],
    ['infinity', 7, Infinity],
  ])('%s is refused with its point', (_, at, value) => {
    const signal = new Float64Array(50).fill(1);
    signal[at] = value;
    try {
      integrate({ timeMin: times(50), signal });
      expect.unreachable();
    } catch (error) {
      expect(error).toBeInstanceOf(TraceProblem);
      expect((error as TraceProblem).pointIndex).toBe(at);
    }
  });

  it('unsorted times and columns of unequal length are refused', () => {
    const timeMin = times(50);
    timeMin[20] = 0;
    expect(() => integrate({ timeMin, signal: new Float64Array(50) })).toThrow('point 21');
    expect(() => integrate({ timeMin: times(50), signal: new Float64Array(49) })).toThrow('equal length');
  });
});

describe('laws that hold for every trace', () => {
  const recipes = fc.record({
    seed: fc.integer({ min: 1, max: 1000 }),
    noise: fc.constantFrom(0, 0.01, 0.2),
    drift: fc.integer({ min: -20, max: 20 }),
    areas: fc.array(fc.integer({ min: 1, max: 100 }), { minLength: 1, maxLength: 5 }),
    tau: fc.integer({ min: 0, max: 40 }),
  });
  type Recipe = typeof recipes extends fc.Arbitrary<infer R> ? R : never;
  const traceOf = ({ seed, noise, drift, areas, tau }: Recipe) =>
    buildEmgTrace({
      peaks: areas.map((area, k) => emg(1.5 + 1.4 * k, area / 2, 0.02, tau / 1000)),
      durationMin: 9,
      pointCount: 3601,
      driftPerMin: drift / 10,
      noise,
      seed,
    });

  it('scaling the signal by a power of two scales areas and heights exactly', () => {
    fc.assert(
      fc.property(recipes, (recipe) => {
        const trace = traceOf(recipe);
        const one = integrate(trace);
        const four = integrate({ ...trace, signal: trace.signal.map((value) => 4 * value) });
        expect(four.peaks.map((peak) => peak.area)).toEqual(one.peaks.map((peak) => 4 * peak.area));
        expect(four.peaks.map((peak) => peak.areaPercent)).toEqual(one.peaks.map((peak) => peak.areaPercent));
      }),
      { numRuns: 40 },
    );
  });

  it('shifting the time shifts the peaks and changes no area', () => {
    fc.assert(
      fc.property(recipes, (recipe) => {
        const trace = traceOf(recipe);
        const one = integrate(trace);
        const later = integrate({ ...trace, timeMin: trace.timeMin.map((t) => t + 4) });
        expect(later.peaks).toHaveLength(one.peaks.length);
        later.peaks.forEach((peak, k) => {
          expect(peak.retentionTimeMin).toBeCloseTo(one.peaks[k]!.retentionTimeMin + 4, 8);
          expect(peak.area / one.peaks[k]!.area).toBeCloseTo(1, 8);
        });
      }),
      { numRuns: 40 },
    );
  });

  it('adding a constant changes nothing', () => {
    fc.assert(
      fc.property(recipes, fc.integer({ min: -500, max: 500 }), (recipe, constant) => {
        const trace = traceOf(recipe);
        const one = integrate(trace);
        const raised = integrate({ ...trace, signal: trace.signal.map((value) => value + constant) });
        expect(raised.peaks).toHaveLength(one.peaks.length);
        raised.peaks.forEach((peak, k) => expect(peak.area / one.peaks[k]!.area).toBeCloseTo(1, 5));
      }),
      { numRuns: 40 },
    );
  });

  it('area % adds up to 100, peaks are in order and do not leave the trace', () => {
    fc.assert(
      fc.property(recipes, (recipe) => {
        const trace = traceOf(recipe);
        const { peaks } = integrate(trace);
        if (peaks.length > 0)
          expect(peaks.reduce((sum, peak) => sum + peak.areaPercent, 0)).toBeCloseTo(100, 9);
        peaks.forEach((peak, k) => {
          expect(peak.number).toBe(k + 1);
          expect(peak.startMin).toBeLessThan(peak.retentionTimeMin);
          expect(peak.endMin).toBeGreaterThan(peak.retentionTimeMin);
          if (k > 0) expect(peak.retentionTimeMin).toBeGreaterThan(peaks[k - 1]!.retentionTimeMin);
        });
      }),
      { numRuns: 40 },
    );
  });

  it('the same points and parameters give the same figures bit for bit, and the points are left alone', () => {
    const trace = buildEmgTrace({
      peaks: resolved,
      durationMin: 12,
      pointCount: 7201,
      noise: 0.1,
      driftPerMin: 1,
    });
    const copy = { timeMin: trace.timeMin.slice(), signal: trace.signal.slice() };
    const first = JSON.stringify(integrate(trace));
    expect(JSON.stringify(integrate(copy))).toBe(first);
    expect(copy.signal).toEqual(trace.signal);
  });

  it('survives any numbers at all without inventing a figure that is no number', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 0, maxLength: 300 }),
        (values) => {
          const result = integrate({
            timeMin: Float64Array.from(values, (_, i) => i / 50),
            signal: Float64Array.from(values),
          });
          for (const peak of result.peaks) {
            for (const figure of [
              peak.area,
              peak.areaPercent,
              peak.height,
              peak.signalToNoise,
              peak.retentionTimeMin,
            ]) {
              expect(Number.isFinite(figure)).toBe(true);
            }
          }
        },
      ),
      { numRuns: 200 },
    );
  });
});
