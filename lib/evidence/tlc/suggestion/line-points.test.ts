import { describe, expect, test } from 'vitest';
import { simplifyLine } from './line-points';

const across = Array.from({ length: 100 }, (_, i) => i * 5);

describe('a traced line in few points', () => {
  test('a tilted line needs two, and strokes that cross it have no say', () => {
    const points = across.map((x, i) => ({ x, y: 40 + 0.03 * x + (i % 10 === 0 ? 12 : 0), weight: 1 }));
    const { line } = simplifyLine(points)!;
    expect(line).toHaveLength(2);
    expect(line[0]!.y).toBeCloseTo(40, 6);
    expect(line[1]!.y).toBeCloseTo(40 + 0.03 * 495, 6);
  });

  test('a curved front needs five and is followed to a sixteenth of its sag', () => {
    const sag = 20;
    const curve = (x: number) => 60 + sag * (1 - (2 * (x / 495) - 1) ** 2);
    const { line } = simplifyLine(across.map((x) => ({ x, y: curve(x), weight: 1 })))!;
    expect(line).toHaveLength(5);
    // Straight pieces over a quarter of a parabola's width stray by a sixteenth of the sag at most.
    for (const p of line) expect(Math.abs(p.y - curve(p.x))).toBeLessThan(sag / 16);
  });

  test('too few points make no line', () => {
    expect(simplifyLine([{ x: 0, y: 0, weight: 1 }])).toBeNull();
  });
});
