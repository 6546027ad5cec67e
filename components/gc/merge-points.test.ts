import { describe, expect, it } from 'vitest';
import { mergePoints } from './merge-points';

const whole = { timeMin: [0, 1, 2, 3, 4], signal: [0, 10, 20, 30, 40] };

describe('finer points in a part of a trace', () => {
  it('take the place of the coarse ones there, and the rest stays', () => {
    const part = { timeMin: [1, 1.5, 2], signal: [11, 15, 21] };
    expect(mergePoints(whole, part)).toEqual({
      timeMin: [0, 1, 1.5, 2, 3, 4],
      signal: [0, 11, 15, 21, 30, 40],
    });
  });

  it('change nothing when there are none, and may lie at either end', () => {
    expect(mergePoints(whole, undefined)).toBe(whole);
    expect(mergePoints(whole, { timeMin: [], signal: [] })).toBe(whole);
    expect(mergePoints(whole, { timeMin: [3.5, 4, 5], signal: [1, 2, 3] }).timeMin).toEqual([
      0, 1, 2, 3, 3.5, 4, 5,
    ]);
  });
});
