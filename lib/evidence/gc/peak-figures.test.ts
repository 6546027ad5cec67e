import { describe, expect, it } from 'vitest';
import { buildEmgTrace } from '@/tests/factories/emg-trace';
import { parabolaApex } from './apex';
import { decimateTrace } from './decimate';
import { integrate } from './integrate';
import { defaultIntegrationParameters, integrationParametersSchema } from './parameters';
import { plateNumber, resolution, signalToNoise, symmetryFactor } from './peak-figures';
import { smoothSavitzkyGolay, savitzkyGolayWeights } from './smooth';

describe('figures of the pharmacopoeias', () => {
  const first = { retentionTimeMin: 5.2, widthHalfMin: 0.08 };
  const second = { retentionTimeMin: 5.6, widthHalfMin: 0.09 };

  it('resolution of 5.20 and 5.60 min with half widths 0.08 and 0.09 min is 2.78', () => {
    // Rs = 1.18 (t2 - t1)/(w1 + w2): USP <621>, Ph. Eur. 2.2.46.
    expect(resolution(first, second)).toBeCloseTo(2.776, 3);
  });

  it('a peak at 5.60 min, 0.09 min wide at half height, has 21,449 plates', () => {
    // N = 5.54 (t/w)^2: USP <621>, Ph. Eur. 2.2.46.
    expect(Math.round(plateNumber(5.6, 0.09))).toBe(21_449);
  });

  it('a peak 0.24 min wide at 5 % with 0.10 min in front of the apex has a symmetry factor of 1.20', () => {
    // As = w0.05/(2d): USP <621>, Ph. Eur. 2.2.46.
    expect(symmetryFactor(0.24, 0.1)).toBeCloseTo(1.2, 12);
  });

  it('S/N is twice the height over the peak-to-peak noise', () => {
    // S/N = 2H/h: USP <621>, Ph. Eur. 2.2.46.
    expect(signalToNoise(30, 2)).toBe(30);
  });

  it('a Gaussian peak gives back the figures that follow from its standard deviation', () => {
    const sigma = 0.02;
    const peaks = [
      { atMin: 4, sigmaMin: sigma, areaUnits: 5 },
      { atMin: 4.2, sigmaMin: sigma, areaUnits: 5 },
    ];
    const result = integrate(buildEmgTrace({ peaks, durationMin: 8, pointCount: 9601 }));
    const [one, two] = result.peaks;
    // Half width 2 sqrt(2 ln 2) = 2.3548 standard deviations; height = area/(sigma sqrt(2 pi)).
    expect(one!.widthHalfMin! / sigma).toBeCloseTo(2.3548, 2);
    expect(one!.height / (5 / (sigma * Math.sqrt(2 * Math.PI)))).toBeCloseTo(1, 3);
    expect(one!.retentionTimeMin).toBeCloseTo(4, 5);
    expect(one!.tailing).toBeCloseTo(1, 2);
    expect(one!.plates! / (5.54 * (4 / (2.3548 * sigma)) ** 2)).toBeCloseTo(1, 2);
    expect(two!.resolution).toBeCloseTo((1.18 * 10) / (2 * 2.3548), 1);
    expect(one!.resolution).toBeNull();
  });

  it('reported S/N follows from the range of white noise', () => {
    // The range of some hundred normal values is 5 to 7 standard deviations (Tippett 1925, from memory).
    const peaks = [{ atMin: 4, sigmaMin: 0.02, areaUnits: 5 }];
    const result = integrate(buildEmgTrace({ peaks, durationMin: 8, pointCount: 9601, noise: 0.2 }));
    expect(result.noise.standardDeviation).toBeGreaterThan(0.18);
    expect(result.noise.standardDeviation).toBeLessThan(0.22);
    expect(result.noise.peakToPeak / 0.2).toBeGreaterThan(5);
    expect(result.noise.peakToPeak / 0.2).toBeLessThan(8);
  });
});

describe('the apex', () => {
  it('is exact on a parabola between points', () => {
    const points = Float64Array.from({ length: 9 }, (_, i) => 10 - (i - 4.3) ** 2);
    const apex = parabolaApex(points, 4, 1);
    expect(apex.index).toBeCloseTo(4.3, 12);
    expect(apex.height).toBeCloseTo(10, 12);
  });
});

describe('smoothing', () => {
  it('has the published weights for a parabola through five points', () => {
    // Savitzky & Golay, Anal. Chem. 36 (1964) 1627, table I: (-3, 12, 17, 12, -3)/35.
    const weights = [...savitzkyGolayWeights(5, 2)].map((weight) => weight * 35);
    [-3, 12, 17, 12, -3].forEach((weight, k) => expect(weights[k]).toBeCloseTo(weight, 10));
  });

  it('leaves a cubic as it is and keeps the number of points', () => {
    const cubic = Float64Array.from({ length: 60 }, (_, i) => 0.01 * i ** 3 - i * i + 3);
    const smoothed = smoothSavitzkyGolay(cubic, 11, 2);
    expect(smoothed).toHaveLength(60);
    for (let i = 5; i < 55; i++) expect(smoothed[i]).toBeCloseTo(cubic[i]!, 6);
  });

  it('is off unless asked for, and keeps the area when it is on', () => {
    expect(defaultIntegrationParameters.smoothing).toBeNull();
    const peaks = [{ atMin: 4, sigmaMin: 0.03, areaUnits: 5 }];
    const trace = buildEmgTrace({ peaks, durationMin: 8, pointCount: 4801, noise: 0.1 });
    const result = integrate(trace, { smoothing: { method: 'savitzky-golay', windowPoints: 11, order: 2 } });
    expect(result.peaks).toHaveLength(1);
    expect(result.peaks[0]!.area).toBeCloseTo(5, 1);
  });
});

describe('thinning for a plot', () => {
  it('keeps every extreme, the ends, and the order of time', () => {
    const trace = buildEmgTrace({ peaks: [], durationMin: 10, pointCount: 100_000, noise: 1 });
    trace.signal[54_321] = 99;
    trace.signal[54_399] = -99;
    const thin = decimateTrace(trace.timeMin, trace.signal, 800);
    expect(thin.signal.length).toBeLessThanOrEqual(1602);
    expect(thin.signal).toContain(99);
    expect(thin.signal).toContain(-99);
    expect(thin.timeMin[0]).toBe(trace.timeMin[0]);
    expect(thin.timeMin[thin.timeMin.length - 1]).toBe(10);
    for (let i = 1; i < thin.timeMin.length; i++)
      expect(thin.timeMin[i]).toBeGreaterThan(thin.timeMin[i - 1]!);
  });

  it('gives a short or narrow range back whole', () => {
    const trace = buildEmgTrace({ peaks: [], durationMin: 10, pointCount: 1001, noise: 1 });
    expect(decimateTrace(trace.timeMin, trace.signal, 2000).signal).toEqual(trace.signal);
    const part = decimateTrace(trace.timeMin, trace.signal, 500, 2, 3);
    expect(part.timeMin[0]).toBe(2);
    expect(part.timeMin[part.timeMin.length - 1]).toBe(3);
    expect(decimateTrace(trace.timeMin, trace.signal, 500, 20, 30).signal).toHaveLength(0);
  });
});

describe('the parameters', () => {
  it('have a default each and refuse what makes no sense', () => {
    expect(integrationParametersSchema.parse({})).toEqual(defaultIntegrationParameters);
    for (const wrong of [
      { minimumSignalToNoise: 0 },
      { minimumAreaPercent: -1 },
      { exclude: [{ fromMin: 3, toMin: 2, reason: 'solvent' }] },
      { exclude: [{ fromMin: 1, toMin: 2, reason: '' }] },
      { smoothing: { method: 'savitzky-golay', windowPoints: 8 } },
      { unknown: 1 },
    ]) {
      expect(integrationParametersSchema.safeParse(wrong).success).toBe(false);
    }
  });
});
