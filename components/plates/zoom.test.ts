import { expect, it } from 'vitest';
import { betweenFingers, clampZoom, stepZoom } from './zoom';

it('steps to the next round zoom, also from between', () => {
  expect(stepZoom(1, 1)).toBe(1.5);
  expect(stepZoom(2.3, 1)).toBe(3);
  expect(stepZoom(2.3, -1)).toBe(2);
  expect(stepZoom(8, 1)).toBe(8);
  expect(stepZoom(1, -1)).toBe(1);
});

it('never makes the photo smaller than whole', () => {
  expect([clampZoom(0.3), clampZoom(20)]).toEqual([1, 8]);
});

it('finds the middle and the distance of two fingers', () => {
  const between = betweenFingers({ clientX: 0, clientY: 0 }, { clientX: 6, clientY: 8 });
  expect(between).toEqual({ distance: 10, x: 3, y: 4 });
});
