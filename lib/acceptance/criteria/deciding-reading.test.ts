import { describe, expect, it } from 'vitest';
import { bare, ethylAcetate, readAs } from '../compound-facts.fixture';
import type { RefractiveInput } from '../judge-inputs';
import { judge } from '../verdict';

/** Readings in order of time; the tolerance is 0.0005, U 0.0002 (JCGM 106:2012, guarded acceptance). */
function judged(...inTime: RefractiveInput[]) {
  const [refractive = null, ...earlierRefractive] = [...inTime].reverse();
  const criteria = { refractiveIndexTolerance: 0.0005 };
  const specification = { id: 's', grade: 'g', edition: 1, decisionRule: 'guarded' as const, criteria };
  return judge({ ...bare(ethylAcetate), refractive, earlierRefractive, specification }).criteria[0]!;
}

const good = readAs(ethylAcetate, 0.0001);
const bad = readAs(ethylAcetate, 0.002);
const between = readAs(ethylAcetate, 0.0004);
const offInstrument = { ...bad, waterReading: 1.3337, waterTemperatureC: 20 };

function withU(reading: RefractiveInput, expandedUncertainty: number): RefractiveInput {
  return { ...reading, comparison: { ...reading.comparison!, expandedUncertainty } };
}

describe('several readings of one fraction', () => {
  it('lets the worst decide: a later good one never hides a fail', () => {
    const result = judged(bad, good, good);
    expect(result.state).toBe('fail');
    expect(result.reason).toContain('Of 3 readings');
    expect(result.reason).toContain('number 1 in order of time');
  });
  it('fails by the latest too, and says so', () => {
    const result = judged(good, bad);
    expect(result.state).toBe('fail');
    expect(result.reason).toContain('number 2, the latest');
  });
  it('lets a valid reading replace one by an instrument that was off or at another wavelength', () => {
    expect(judged(offInstrument, good).state).toBe('pass');
    expect(judged({ ...bad, wavelengthNm: 546.1 }, good).state).toBe('pass');
  });
  it('lets an invalid reading replace nothing', () => {
    expect(judged(good, offInstrument).state).toBe('inconclusive');
    expect(judged(bad, offInstrument, good).state).toBe('fail');
  });
  it('lets an undecided reading give way only to one at most half as uncertain', () => {
    expect(judged(between, good).state).toBe('inconclusive');
    expect(judged(between, withU(good, 0.0001)).state).toBe('pass');
  });
  it('says nothing of several where there is one', () => {
    expect(judged(good).reason).not.toContain('readings of this fraction');
  });
});
