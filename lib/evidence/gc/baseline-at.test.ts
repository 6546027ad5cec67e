import { describe, expect, it } from 'vitest';
import { baselineAt } from './baseline-at';

describe('the baseline at the points of a picture', () => {
  it('runs straight between its corners and level beyond them', () => {
    const corners = { timeMin: [1, 3], signal: [10, 20] };
    expect(baselineAt(corners, [0, 1, 1.5, 2, 3, 9])).toEqual([10, 10, 12.5, 15, 20, 20]);
  });

  it('is nowhere without corners', () => {
    expect(baselineAt({ timeMin: [], signal: [] }, [0, 1])).toEqual([null, null]);
  });
});
