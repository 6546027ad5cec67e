import { expect, it } from 'vitest';
import { applyHomography, findHomography } from '@/lib/evidence/tlc/homography';
import { footUnder, frameOf, laneAt, placeOnLane, throughEdges } from './plate-view';

// A plate of 50 mm by 100 mm, seen askew.
const corners = [
  { x: 120, y: 80 },
  { x: 520, y: 60 },
  { x: 560, y: 840 },
  { x: 60, y: 800 },
];
const onPlate = [
  { x: 0, y: 0 },
  { x: 50, y: 0 },
  { x: 50, y: 100 },
  { x: 0, y: 100 },
];
const found = findHomography(onPlate, corners);
if (!found.ok) throw new Error(found.problem);
const toPhoto = (x: number, y: number) => applyHomography(found.matrix, { x, y });
const extent = { width: 600, height: 900 };
const frame = frameOf({ corners }, { widthMm: 50, heightMm: 100 });
const baseline = [toPhoto(5, 90), toPhoto(45, 90)];

it('finds the foot of the lane that runs through a place, on the plate and not in the photo', () => {
  const foot = footUnder({ baseline }, frame, toPhoto(20, 30));
  expect(foot).toBeCloseTo(toPhoto(20, 90).x, 6);
  expect(Math.abs(foot - toPhoto(20, 30).x)).toBeGreaterThan(5);
  expect(footUnder({ baseline }, null, { x: 123, y: 4 })).toBe(123);
});

it('gives a spot to the lane below it on the plate, however tilted the photo', () => {
  const lane = (x: number) => ({
    label: '',
    x: toPhoto(x, 90).x,
    subject: { kind: 'crude' as const },
    dilutionPercent: '',
    spots: [],
  });
  const marks = { corners, baseline, front: [], lanes: [lane(8), lane(14)] };
  expect(laneAt(marks, frame, toPhoto(10.5, 20))).toBe(0);
  expect(laneAt(marks, frame, toPhoto(11.5, 20))).toBe(1);
});

it('draws a lane and a line to the edges of the plate', () => {
  const top = placeOnLane({ baseline }, frame, toPhoto(20, 90).x, 0, extent);
  expect(top.x).toBeCloseTo(toPhoto(20, 0).x, 6);
  const line = throughEdges(baseline, frame, extent);
  expect(line[0]!.x).toBeCloseTo(toPhoto(0, 90).x, 6);
  expect(line.at(-1)!.y).toBeCloseTo(toPhoto(50, 90).y, 6);
  expect(throughEdges(baseline, null, extent)[0]!.x).toBe(0);
});

it('has no frame without four corners that outline a plate', () => {
  expect(frameOf({ corners: corners.slice(1) }, {})).toBeNull();
  expect(frameOf({ corners: [corners[0]!, corners[2]!, corners[1]!, corners[3]!] }, {})).toBeNull();
});
