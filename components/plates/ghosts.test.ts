import { expect, it } from 'vitest';
import type { PlatePhotoView } from '@/lib/evidence/tlc/schema';
import { ghostsOf, linesFrom } from './ghosts';
import { noMarks } from './marks';
import { frameOf } from './plate-view';

const square = (left: number, size: number) => [
  { x: left, y: left },
  { x: left + size, y: left },
  { x: left + size, y: left + size },
  { x: left, y: left + size },
];
const other = {
  id: 'uv',
  evidenceId: 'photo-uv',
  visualiser: 'uv-254',
  units: 'px',
  corners: square(0, 400),
  plateUnit: 'relative',
  baseline: [
    { x: 40, y: 360 },
    { x: 360, y: 360 },
  ],
  front: [
    { x: 40, y: 40 },
    { x: 360, y: 40 },
  ],
  lanes: [
    {
      label: 'F3',
      x: 200,
      spots: [
        {
          rf: 0.5,
          plateX: 0.5,
          plateY: 0.5,
          projections: [{ evidenceId: 'photo-stain', x: 7, y: 8 }],
        },
      ],
    },
  ],
} as unknown as PlatePhotoView;
const marks = { ...noMarks, corners: square(100, 200) };

it('shows the spots of the other photo where the corners of this one put them', () => {
  const [ghost, ...more] = ghostsOf([other], 'photo-stain', frameOf(marks, {}));
  expect(more).toEqual([]);
  expect(ghost).toMatchObject({ label: 'F3', rf: 0.5, lane: 0, visualiser: 'UV 254 nm' });
  expect(ghost!.x).toBeCloseTo(200, 9);
  expect(ghost!.y).toBeCloseTo(200, 9);
});

it('takes the server’s places while the size has changed, and shows nothing without corners or of itself', () => {
  const inMm = frameOf(marks, { widthMm: 50, heightMm: 50 });
  expect(ghostsOf([other], 'photo-stain', inMm)).toMatchObject([{ x: 7, y: 8 }]);
  expect(ghostsOf([other], 'photo-stain', null)).toEqual([]);
  expect(ghostsOf([other], 'photo-uv', frameOf(marks, {}))).toEqual([]);
});

it('carries lines and lanes over from the other photo, but no spots', () => {
  const lane = {
    label: 'F3',
    x: 1,
    subject: { kind: 'crude' as const },
    dilutionPercent: '',
    spots: [{ x: 1, y: 2, shape: 'spot' as const }],
  };
  const taken = linesFrom(other, { ...marks, lanes: [lane] }, {});
  expect(taken!.baseline).toEqual([
    { x: 120, y: 280 },
    { x: 280, y: 280 },
  ]);
  expect(taken!.lanes).toMatchObject([{ label: 'F3', spots: [{ x: 1, y: 2 }] }]);
  expect(taken!.lanes[0]!.x).toBeCloseTo(200, 6);
  expect(linesFrom(other, noMarks, {})).toBeNull();
});
