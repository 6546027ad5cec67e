import { describe, expect, it } from 'vitest';
import { linearScale, roundTicks, tickDecimals } from './scale';

describe('a linear scale', () => {
  it('maps the ends of the domain to the ends of the range, also upside down', () => {
    const y = linearScale([20, 80], [100, 0]);
    expect([y(20), y(50), y(80)]).toEqual([100, 50, 0]);
  });

  it('puts everything in the middle when the domain has no width', () => {
    expect(linearScale([77, 77], [0, 10])(77)).toBe(5);
  });
});

describe('round ticks', () => {
  it('lie inside the ends, are evenly spaced and never more than asked for', () => {
    for (const [low, high] of [
      [61.3, 78.9],
      [0, 1],
      [-12, 260],
      [99.21, 99.97],
    ] as const) {
      const ticks = roundTicks(low, high, 5);
      expect(ticks.length).toBeLessThanOrEqual(5);
      expect(ticks.length).toBeGreaterThanOrEqual(2);
      expect(ticks[0]).toBeGreaterThanOrEqual(low);
      expect(ticks.at(-1)).toBeLessThanOrEqual(high);
    }
    expect(roundTicks(61.3, 78.9, 5)).toEqual([65, 70, 75]);
  });

  it('are the one value when both ends are the same', () => {
    expect(roundTicks(5, 5, 4)).toEqual([5]);
  });

  it('say how many decimals their labels need', () => {
    expect(tickDecimals([99.2, 99.4])).toBe(1);
    expect(tickDecimals([60, 70])).toBe(0);
    expect(tickDecimals([0.05, 0.1])).toBe(2);
  });
});
