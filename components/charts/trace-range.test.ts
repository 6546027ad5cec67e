import { describe, expect, it } from 'vitest';
import { indexAt } from './trace-options';
import { nextRange } from './trace-range';

const whole = { fromMin: 0, toMin: 20 };

describe('the part of a trace that is shown', () => {
  it('halves about its middle when zooming in and doubles when zooming out', () => {
    expect(nextRange(whole, whole, 'in')).toEqual({ fromMin: 5, toMin: 15 });
    expect(nextRange({ fromMin: 8, toMin: 12 }, whole, 'out')).toEqual({ fromMin: 6, toMin: 14 });
  });

  it('never leaves the trace, and keeps its width at the ends', () => {
    expect(nextRange({ fromMin: 1, toMin: 5 }, whole, 'earlier')).toEqual({ fromMin: 0, toMin: 4 });
    expect(nextRange({ fromMin: 17, toMin: 20 }, whole, 'later')).toEqual({ fromMin: 17, toMin: 20 });
    expect(nextRange({ fromMin: 2, toMin: 18 }, whole, 'out')).toEqual(whole);
  });

  it('is all of it on demand', () => {
    expect(nextRange({ fromMin: 8, toMin: 9 }, whole, 'all')).toEqual(whole);
  });
});

describe('looking a time up in a trace', () => {
  it('finds the first point that is not earlier', () => {
    const time = [0, 1, 2, 3];
    expect([indexAt(time, -1), indexAt(time, 1), indexAt(time, 1.5), indexAt(time, 9)]).toEqual([0, 1, 2, 4]);
  });
});
