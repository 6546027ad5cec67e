import { describe, expect, it } from 'vitest';
import { areaPercentUncertainty } from './area-uncertainty';
import {
  bare,
  decane,
  ethanol,
  ethylAcetate,
  gcTrace,
  limonene,
  photoUnder,
  readAs,
  water,
} from './compound-facts.fixture';
import type { Criteria } from './criteria/registry';
import { criteriaSchema } from './criteria/registry';
import type { JudgeInputs } from './judge-inputs';
import { judge } from './verdict';

function withLimits(
  inputs: JudgeInputs,
  criteria: Criteria,
  decisionRule: 'simple' | 'guarded' = 'guarded',
): JudgeInputs {
  return {
    ...inputs,
    specification: { id: 's', grade: 'working grade', edition: 1, decisionRule, criteria },
  };
}

const gc99 = { gcAreaPercentMin: 99 };

describe('the state of the whole', () => {
  it('is incomplete without a specification, and says who must write one', () => {
    const { state, summary } = judge(bare(ethylAcetate));
    expect(state).toBe('incomplete');
    expect(summary).toContain('A PI must write one');
  });
  it('is incomplete while asked-for evidence is missing, and names it', () => {
    const { state, summary } = judge(withLimits(bare(ethylAcetate), gc99));
    expect(state).toBe('incomplete');
    expect(summary).toContain('GC area % of the target');
  });
  it('passes when every limit is met and every known impurity is seen', () => {
    const inputs = { ...bare(ethylAcetate, ethanol), traces: [gcTrace(ethylAcetate)] };
    expect(judge(withLimits(inputs, gc99))).toMatchObject({ state: 'pass', purityPercent: 99.8 });
  });
  it('is blind when water is a known impurity and only a flame ionisation detector looked', () => {
    const inputs = { ...bare(ethylAcetate, water), traces: [gcTrace(ethylAcetate)] };
    const { state, summary } = judge(withLimits(inputs, gc99));
    expect(state).toBe('blind');
    expect(summary).toContain('refractive index');
  });
  it('is no longer blind once a test that sees it is done', () => {
    const inputs = {
      ...bare(ethylAcetate, water),
      traces: [gcTrace(ethylAcetate)],
      refractive: readAs(ethylAcetate),
    };
    expect(judge(withLimits(inputs, gc99)).state).toBe('pass');
  });
  it('is fail before anything else', () => {
    const inputs = { ...bare(ethylAcetate, water), traces: [gcTrace(ethylAcetate, { areaPercent: 5 })] };
    expect(judge(withLimits(inputs, { ...gc99, refractiveIndexTolerance: 0.0005 })).state).toBe('fail');
  });
  it('is blind before incomplete: more of the same evidence would not help', () => {
    const inputs = { ...bare(ethylAcetate, water), traces: [gcTrace(ethylAcetate)] };
    expect(judge(withLimits(inputs, { ...gc99, tlcCleanUnder: ['uv-254'] })).state).toBe('blind');
  });
  it('is incomplete, not blind, before any test was done', () => {
    expect(judge(withLimits(bare(ethylAcetate, water), gc99)).state).toBe('incomplete');
  });
  it('is inconclusive when the uncertainty reaches over a limit (JCGM 106:2012, guarded acceptance)', () => {
    const inputs = { ...bare(ethylAcetate), refractive: readAs(ethylAcetate, 0.0004) };
    const limits = { refractiveIndexTolerance: 0.0005 };
    expect(judge(withLimits(inputs, limits)).state).toBe('inconclusive');
    expect(judge(withLimits(inputs, limits, 'simple')).state).toBe('pass');
  });
  it('gives the same judgement for the same inputs', () => {
    const inputs = withLimits({ ...bare(ethylAcetate, ethanol), traces: [gcTrace(ethylAcetate)] }, gc99);
    expect(judge(inputs)).toEqual(judge(structuredClone(inputs)));
  });
});

describe('criteria', () => {
  const one = (inputs: JudgeInputs, criteria: Criteria) => judge(withLimits(inputs, criteria)).criteria[0];

  it('says so when no peak is assigned and takes the largest', () => {
    const trace = gcTrace(ethylAcetate);
    trace.peaks[0]!.compoundId = null;
    const result = one({ ...bare(ethylAcetate), traces: [trace] }, gc99);
    expect(result).toMatchObject({ state: 'pass', measured: '99.80 %' });
    expect(result?.reason).toContain('the largest');
  });
  it('does not take a peak of another compound for the target', () => {
    const trace = gcTrace(ethanol);
    expect(one({ ...bare(ethylAcetate), traces: [trace] }, gc99)?.state).toBe('inconclusive');
  });
  it('lets the worst of several traces decide', () => {
    const traces = [gcTrace(ethylAcetate), gcTrace(ethylAcetate, { areaPercent: 5 })];
    expect(one({ ...bare(ethylAcetate), traces }, gc99)?.state).toBe('fail');
    expect(judge({ ...bare(ethylAcetate), traces }).purityPercent).toBe(95);
  });
  it('fails a single impurity over its limit and names its peak', () => {
    const inputs = { ...bare(ethylAcetate), traces: [gcTrace(ethylAcetate, { areaPercent: 0.8 })] };
    const result = one(inputs, { gcSingleImpurityMaxPercent: 0.5 });
    expect(result).toMatchObject({ state: 'fail', measured: '0.80 %' });
    expect(result?.reason).toContain('Peak 2');
  });
  it('does not pass a single-impurity limit that the trace cannot quantify (S/N 10, ICH Q2)', () => {
    const trace = gcTrace(ethylAcetate);
    trace.peaks = [{ ...trace.peaks[0]!, areaPercent: 100, signalToNoise: 500 }];
    expect(one({ ...bare(ethylAcetate), traces: [trace] }, { gcSingleImpurityMaxPercent: 0.5 })?.state).toBe(
      'inconclusive',
    );
  });
  it('fails a lane with two spots and passes one with one', () => {
    const lane = photoUnder('permanganate');
    const two = { ...lane, spots: [...lane.spots, { rf: 0.2, rfUncertainty: 0.012, flags: [] }] };
    const limits: Criteria = { tlcCleanUnder: ['permanganate'] };
    expect(one({ ...bare(limonene), lanes: [lane] }, limits)?.state).toBe('pass');
    expect(one({ ...bare(limonene), lanes: [two] }, limits)?.state).toBe('fail');
  });
  it('does not take two spots under two visualisers for one', () => {
    const lane = photoUnder('permanganate');
    const other = { rf: 0.2, visualiserIds: ['uv-254'], perspectiveCorrected: true };
    const judged = (elsewhere: (typeof other)[], tlcCleanUnder: string[]) =>
      judge(
        withLimits({ ...bare(limonene), lanes: [{ ...lane, elsewhere }] }, { tlcCleanUnder } as Criteria),
      ).criteria.find((one) => one.name.includes('permanganate'))?.state;
    expect(judged([], ['permanganate'])).toBe('pass');
    expect(judged([other], ['permanganate', 'uv-254'])).toBe('fail');
    expect(judged([other], ['permanganate'])).toBe('inconclusive');
    expect(judged([{ ...other, perspectiveCorrected: false }], ['permanganate', 'uv-254'])).toBe(
      'inconclusive',
    );
  });
  it('calls an empty lane blind where the visualiser cannot show even the target', () => {
    const lane = { ...photoUnder('uv-254'), spots: [] };
    expect(one({ ...bare(decane), lanes: [lane] }, { tlcCleanUnder: ['uv-254'] })?.state).toBe('blind');
  });
  it('calls water blind where only a flame ionisation detector looked', () => {
    const inputs = { ...bare(ethylAcetate), traces: [gcTrace(ethylAcetate)] };
    expect(one(inputs, { waterMaxPercent: 0.1 })?.state).toBe('blind');
  });
  it('does not compare an index read at another wavelength or on an instrument that is off (USP <831>)', () => {
    const reading = readAs(ethylAcetate);
    const limits = { refractiveIndexTolerance: 0.001 };
    const green = { ...bare(ethylAcetate), refractive: { ...reading, wavelengthNm: 546.1 } };
    const off = {
      ...bare(ethylAcetate),
      refractive: { ...reading, waterReading: 1.3337, waterTemperatureC: 20 },
    };
    expect(one(green, limits)?.state).toBe('inconclusive');
    expect(one(off, limits)?.state).toBe('inconclusive');
  });
  it('compares head temperatures with the boiling point at the recorded pressure', () => {
    const head = (fromC: number, toC: number) => ({
      ...bare(ethylAcetate),
      head: { fromC, toC, pressureMbar: 1013.25 },
    });
    const limits = { boilingRange: { toleranceC: 5 } };
    expect(one(head(76.8, 77.3), limits)?.state).toBe('pass');
    expect(one(head(88, 95), limits)?.state).toBe('fail');
    expect(one(bare(ethylAcetate), limits)?.state).toBe('missing');
  });
});

describe('limits and uncertainty', () => {
  it('refuses a specification without limits or with an unknown one', () => {
    expect(criteriaSchema.safeParse({}).success).toBe(false);
    expect(criteriaSchema.safeParse({ gcAreaPercentMin: 99, colour: 'clear' }).success).toBe(false);
  });
  it('propagates the noise of the areas to area per cent (JCGM 100:2008, 5.1.2)', () => {
    // Two peaks of 99 and 1 % with S/N 1000 and 10: u = 0.01 * 0.099 and 0.99 * 0.1, so U = 2 * 0.0990.
    const peak = (number: number, areaPercent: number, signalToNoise: number) => ({
      number,
      areaPercent,
      signalToNoise,
      retentionTimeMin: number,
      widthHalfMin: 0.1,
      compoundId: null,
    });
    expect(areaPercentUncertainty([peak(1, 99, 1000), peak(2, 1, 10)], [1])).toBeCloseTo(0.198, 3);
  });
});
