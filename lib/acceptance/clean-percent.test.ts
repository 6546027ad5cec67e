import { describe, expect, it } from 'vitest';
import { bare, ethylAcetate, gcTrace } from './compound-facts.fixture';
import { cleanPercent } from './clean-percent';
import { judge } from './verdict';

describe('cleanPercent', () => {
  it('takes the dust of binary sums off and keeps what was measured', () => {
    expect(cleanPercent(100.00000000000001)).toBe(100);
    expect(cleanPercent(99.79999999999998)).toBe(99.8);
    expect(cleanPercent(0.000001)).toBe(0.000001);
  });
  it('holds for the purity of a judgement', () => {
    const trace = gcTrace(ethylAcetate);
    trace.peaks = [{ ...trace.peaks[0]!, areaPercent: 100.00000000000001 }];
    expect(judge({ ...bare(ethylAcetate), traces: [trace] }).purityPercent).toBe(100);
  });
});
