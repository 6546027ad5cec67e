import { expect, it } from 'vitest';
import { orderCorners } from './order-corners';

const [tl, tr, br, bl] = [
  { x: 30, y: 40 },
  { x: 400, y: 20 },
  { x: 420, y: 610 },
  { x: 20, y: 600 },
];

it('puts corners into order however they were pressed', () => {
  for (const corners of [
    [br, tl, tr, bl],
    [bl, br, tr, tl],
    [tl, br, tr, bl],
  ])
    expect(orderCorners({ corners, baseline: [], front: [] })).toEqual([tl, tr, br, bl]);
});

it('begins at the front when the plate lies on its side', () => {
  // The solvent ran from right to left: the front stands at the left.
  const baseline = [{ x: 380, y: 300 }];
  const front = [{ x: 60, y: 300 }];
  expect(orderCorners({ corners: [tl, tr, br, bl], baseline, front })).toEqual([bl, tl, tr, br]);
});

it('leaves fewer than four as they are', () => {
  expect(orderCorners({ corners: [br, tl], baseline: [], front: [] })).toEqual([br, tl]);
});
