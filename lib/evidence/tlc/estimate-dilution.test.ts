import { describe, expect, it } from 'vitest';
import { estimateByDilution, type ProfiledForEstimate } from './estimate-dilution';

const places = Array.from({ length: 300 }, (_, i) => -0.03 + (1.06 * i) / 299);
/** Gauss-shaped bands on a quiet ground. */
const profile = (...bands: [rf: number, height: number][]) => ({
  rf: places,
  signal: places.map((rf) =>
    bands.reduce((sum, [at, height]) => sum + height * Math.exp(-((rf - at) ** 2) / (2 * 0.015 ** 2)), 0),
  ),
  noise: 0.1,
});
const ester = { id: 'c1', name: 'ethyl acetate' };
const rung = (label: string, dilutionPercent: number | null, height: number): ProfiledForEstimate => ({
  laneId: label,
  label,
  subject: { kind: 'reference', compound: ester },
  dilutionPercent,
  spots: [{ rf: 0.7, rfUncertainty: 0.012 }],
  profile: profile([0.7, height]),
});
const fraction = (height: number, ...spots: number[]): ProfiledForEstimate => ({
  laneId: 'F',
  label: 'F',
  subject: { kind: 'fraction', code: 'D-1' },
  dilutionPercent: null,
  spots: spots.map((rf) => ({ rf, rfUncertainty: 0.012 })),
  profile: profile([0.3, 20], [0.7, height]),
});
const stateOf = (lanes: ProfiledForEstimate[]) =>
  estimateByDilution(lanes).map((one) => [one.state, one.abovePercent, one.belowPercent]);

describe('an amount by diluted lanes', () => {
  const ladder = [rung('1', 1, 2), rung('10', 10, 9)];

  it('is fainter than the weakest, between two, or at least as strong as the strongest', () => {
    expect(stateOf([fraction(0.5, 0.3), ...ladder])).toEqual([['fainter', null, 1]]);
    expect(stateOf([fraction(5, 0.3, 0.7), ...ladder])).toEqual([['between', 1, 10]]);
    expect(stateOf([fraction(12, 0.3, 0.7), ...ladder])).toEqual([['as strong or stronger', 10, null]]);
    expect(estimateByDilution([fraction(0.5, 0.3), ...ladder])[0]!.words).toBe(
      'Lane F, ethyl acetate at Rf 0.70: fainter than the 1 % lane.',
    );
  });

  it('counts a lane that was not diluted as the whole', () => {
    expect(stateOf([fraction(12, 0.3, 0.7), ...ladder, rung('R', null, 40)])).toEqual([['between', 10, 100]]);
  });

  it('is not stated from a lane that shows nothing itself, nor beside a spot that may cover it', () => {
    const unseen = [rung('1', 1, 0.005), rung('10', 10, 0.01)];
    expect(stateOf([fraction(0.5, 0.3), ...unseen])).toEqual([['not judged', null, null]]);
    expect(stateOf([fraction(0.5, 0.65), ...ladder])).toEqual([['not judged', null, null]]);
  });

  it('is not stated from lanes that do not grow with their amounts', () => {
    expect(stateOf([fraction(5, 0.3, 0.7), rung('1', 1, 9), rung('10', 10, 2)])).toEqual([
      ['not judged', null, null],
    ]);
  });

  it('needs a diluted lane', () => {
    expect(estimateByDilution([fraction(5, 0.3), rung('R', null, 40)])).toEqual([]);
  });
});
