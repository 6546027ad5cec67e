import { describe, expect, it } from 'vitest';
import { carryAssignments } from './carry-assignments';

const peak = (number: number, retentionTimeMin: number, half = 0.1) => ({
  number,
  retentionTimeMin,
  startMin: retentionTimeMin - half,
  endMin: retentionTimeMin + half,
});

describe('taking assignments over to a new version', () => {
  it('follows the peak when its number changes', () => {
    const carried = carryAssignments(
      [
        { retentionTimeMin: 5, compoundId: 'a' },
        { retentionTimeMin: 6, compoundId: null },
      ],
      [peak(1, 4), peak(2, 5.01), peak(3, 6)],
    );
    expect([...carried]).toEqual([[2, 'a']]);
  });

  it('drops an assignment whose peak is no longer there', () => {
    expect(carryAssignments([{ retentionTimeMin: 5, compoundId: 'a' }], [peak(1, 7)]).size).toBe(0);
  });

  it('gives a merged peak the compound of the nearer apex, and a split one only to the nearer part', () => {
    const merged = carryAssignments(
      [
        { retentionTimeMin: 5, compoundId: 'a' },
        { retentionTimeMin: 5.08, compoundId: 'b' },
      ],
      [peak(1, 5.06)],
    );
    expect([...merged]).toEqual([[1, 'b']]);
    const split = carryAssignments(
      [{ retentionTimeMin: 5, compoundId: 'a' }],
      [peak(1, 4.95), peak(2, 5.02)],
    );
    expect([...split]).toEqual([[2, 'a']]);
  });
});
