import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { judgeBoilingRange, type BoilingRangeInput } from './boiling-range';

const cut = (from: number, to: number, more: Partial<BoilingRangeInput> = {}) =>
  judgeBoilingRange({
    headTemperatureFromC: from,
    headTemperatureToC: to,
    pressureMbar: 66.7,
    expected: { boilingPointC: 36.4, uncertaintyC: 1, method: 'wagner' },
    toleranceC: 2,
    ...more,
  });

describe('boiling range of a cut', () => {
  it('refuses numbers that are none and a tolerance or pressure that is not above zero', () => {
    expect(() => cut(Number.NaN, 36)).toThrow(RangeError);
    expect(() => cut(36, 37, { toleranceC: 0 })).toThrow(RangeError);
    expect(() => cut(36, 37, { pressureMbar: -1 })).toThrow(RangeError);
    expect(() =>
      cut(36, 37, { expected: { boilingPointC: Number.NaN, uncertaintyC: 1, method: 'wagner' } }),
    ).toThrow(RangeError);
    expect(() => cut(36, 37, { maximumWidthC: -1 })).toThrow(RangeError);
  });

  it('passes toluene collected at 35.8 to 37.1 °C at 50 mmHg (36.4 °C, VDI Heat Atlas)', () => {
    const result = cut(35.8, 37.1, { maximumWidthC: 2 });
    expect(result.state).toBe('pass');
    expect(result.distanceC).toBeCloseTo(0.7, 9);
    expect(result.widthC).toBeCloseTo(1.3, 9);
    expect(result.reason).toMatch(/0\.7 °C above the 36\.4 °C expected at 66\.7 mbar \(Wagner/);
  });

  it('judges the end that lies further away, and keeps its sign', () => {
    expect(cut(30, 36).distanceC).toBeCloseTo(-6.4, 9);
    expect(cut(30, 36).state).toBe('fail');
  });

  it('counts the error of the method into the tolerance', () => {
    // hypot(1, 0.5) = 1.118, hypot(2, 1.118) = 2.291, 2 + 1.118 = 3.118
    expect(cut(36.4, 36.4).uncertaintyC).toBeCloseTo(1.118, 3);
    expect(cut(36.4, 38.6).state).toBe('pass');
    expect(cut(36.4, 38.9).state).toBe('inconclusive');
    expect(cut(36.4, 39.6).state).toBe('fail');
  });

  it('cannot pass on an estimate that is worse than the tolerance, but can still fail', () => {
    const expected = { boilingPointC: 36.4, uncertaintyC: 4.4, method: 'maxwell-bonnell' as const };
    const near = cut(36.4, 36.6, { expected });
    expect(near.state).toBe('inconclusive');
    expect(near.reason).toMatch(/larger than the tolerance/);
    expect(cut(50, 51, { expected }).state).toBe('fail');
  });

  it('fails a cut wider than allowed and says how the next component shows', () => {
    const result = cut(35.4, 38, { maximumWidthC: 2 });
    expect(result.state).toBe('fail');
    expect(result.reason).toMatch(/2\.6 °C wide, 2 °C allowed/);
    expect(result.notes.join()).toMatch(/next component/);
  });

  it('takes a sinking head temperature for too little vapour, not for a new compound (common practice)', () => {
    const result = cut(36.5, 28, { maximumWidthC: 2 });
    expect(result.state).toBe('pass');
    expect(result.sank).toBe(true);
    expect([result.lowC, result.highC]).toEqual([28, 36.5]);
    expect(result.notes.join()).toMatch(/too little vapour/);
  });

  it('never gets better as a cut moves away', () => {
    const rank = { pass: 0, inconclusive: 1, fail: 2 };
    const shift = fc.double({ min: 0, max: 15, noNaN: true });
    fc.assert(
      fc.property(shift, shift, fc.double({ min: 0, max: 8, noNaN: true }), (a, b, uncertaintyC) => {
        const expected = { boilingPointC: 36.4, uncertaintyC, method: 'antoine' as const };
        const at = (d: number) => cut(36.4 + d, 36.4 + d, { expected }).state;
        expect(rank[at(Math.max(a, b))]).toBeGreaterThanOrEqual(rank[at(Math.min(a, b))]);
      }),
    );
  });
});
