import { describe, expect, test } from 'vitest';
import { areaOf, convexHull, lineThrough, meet, orderCorners, outerQuadrilateral } from './quadrilateral';

describe('shapes about a patch', () => {
  test('the hull of a square with points inside and on its sides is the square', () => {
    const points = [
      { x: 0, y: 0 },
      { x: 4, y: 0 },
      { x: 4, y: 4 },
      { x: 0, y: 4 },
      { x: 2, y: 0 },
      { x: 1, y: 3 },
    ];
    const hull = convexHull(points);
    expect(hull).toHaveLength(4);
    expect(areaOf(hull)).toBe(16);
  });

  test('a rectangle whose corner is chipped gets its corner back', () => {
    const chipped = [
      { x: 0, y: 0 },
      { x: 9, y: 0 },
      { x: 10, y: 1 },
      { x: 10, y: 20 },
      { x: 0, y: 20 },
    ];
    const corners = orderCorners(outerQuadrilateral(convexHull(chipped))!);
    expect(corners.map((p) => [Math.round(p.x * 1e6) / 1e6, Math.round(p.y * 1e6) / 1e6])).toEqual([
      [0, 0],
      [10, 0],
      [10, 20],
      [0, 20],
    ]);
  });

  test('corners of a plate turned a little keep the order top left, top right, bottom right, bottom left', () => {
    const turned = [
      { x: 95, y: 210 },
      { x: 10, y: 5 },
      { x: 5, y: 200 },
      { x: 100, y: 15 },
    ];
    expect(orderCorners(turned)).toEqual([turned[1], turned[3], turned[0], turned[2]]);
  });

  test('parallel lines meet nowhere, others where they cross', () => {
    const level = lineThrough({ x: 0, y: 1 }, { x: 5, y: 1 });
    expect(meet(level, lineThrough({ x: 0, y: 2 }, { x: 5, y: 2 }))).toBeNull();
    expect(meet(level, lineThrough({ x: 3, y: -4 }, { x: 3, y: 9 }))).toEqual({ x: 3, y: 1 });
  });
});
