import { expect, it } from 'vitest';
import { loupePlace } from './loupe';

const sight = { left: 0, top: 0, right: 400, bottom: 600 };
const apart = (a: { x: number; y: number }, b: { x: number; y: number }) => Math.hypot(a.x - b.x, a.y - b.y);

it('lies above the finger and never over the place', () => {
  expect(loupePlace({ x: 200, y: 400 }, sight, 1)).toEqual({ x: 200, y: 292 });
  for (const at of [
    { x: 200, y: 400 },
    { x: 5, y: 400 },
    { x: 395, y: 400 },
    { x: 200, y: 10 },
    { x: 5, y: 5 },
    { x: 395, y: 100 },
  ])
    expect(apart(loupePlace(at, sight, 1), at)).toBeGreaterThan(52 + 10);
});

it('goes to the side that has room where there is none above', () => {
  expect(loupePlace({ x: 300, y: 20 }, sight, 1).x).toBeLessThan(300);
  expect(loupePlace({ x: 50, y: 20 }, sight, 1).x).toBeGreaterThan(50);
});
