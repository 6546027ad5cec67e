import { openPhoto } from '../photo-decoder';
import { applyHomography, findHomography } from './homography';
import { type Point } from './polyline';
import { findContrast } from './suggestion/contrast';
import { eraseTicks } from './suggestion/erase-ticks';
import {
  type LaneProfile,
  measureAreas,
  type ProfileArea,
  profileLane,
  STRIP_OF_PITCH,
} from './suggestion/lane-profile';
import { findOriginMarks } from './suggestion/origin-marks';
import type { RawPhoto } from './suggestion/raster';
import { rectify } from './suggestion/rectify';

/** Places in pixels of the whole photo as shown; Rf of the spots as they are kept. */
export type ProfileMarks = {
  corners: Point[];
  baseline: Point[];
  front: Point[];
  lanes: { foot: Point | null; spots: (Point & { rf: number })[] }[];
};

export type ProfiledLane = { rf: number[]; signal: number[]; noise: number; areas: ProfileArea[] };

/** Long side at which a photo is looked at, as for the suggestion, px. */
const WORKING_LONG_PX = 1400;
/** Points of a profile. */
const SAMPLES = 300;
/** Half of the widest strip that is averaged, as a share of the plate's width: a usual spot and a little more. */
const WIDEST_STRIP = 0.05;

/**
 * The background-corrected profile of each lane of a photo and the areas of its marked spots. Null for a lane whose
 * place is not known. Pure. Throws a RangeError where the corners outline no plate.
 */
export function profileLanes(photo: RawPhoto, marks: ProfileMarks): (ProfiledLane | null)[] {
  const flat = rectify(photo, marks.corners);
  if (!flat) throw new RangeError('The corners outline no plate that is large enough.');
  const { width, height } = flat;
  const found = findHomography(marks.corners, [
    { x: 0, y: 0 },
    { x: width, y: 0 },
    { x: width, y: height },
    { x: 0, y: height },
  ]);
  if (!found.ok) throw new RangeError(found.problem);
  const carry = (point: Point) => applyHomography(found.matrix, point);
  const line = (points: readonly Point[]) => {
    const carried = points.map(carry).sort((a, b) => a.x - b.x);
    const [only] = carried;
    return carried.length === 1 && only
      ? [
          { x: 0, y: only.y },
          { x: width, y: only.y },
        ]
      : carried;
  };
  const [baseline, front] = [line(marks.baseline), line(marks.front)];
  const { signal } = findContrast(flat, [baseline, front]);
  const half = (points: readonly Point[]) => points.map((p) => ({ x: p.x / 2, y: p.y / 2 }));
  const lines = { baseline: half(baseline), front: half(front) };
  const ticks = findOriginMarks(flat, baseline).map((x) => x / 2);
  eraseTicks(signal, ticks, lines.baseline, Math.max(1.5, 0.005 * signal.height), 0.018 * signal.height);
  const places = marks.lanes.map(({ foot, spots }) => laneX(foot && carry(foot), spots.map(carry)));
  return marks.lanes.map((lane, l) => {
    const x = places[l];
    if (x === null || x === undefined) return null;
    const gaps = places.flatMap((other, k) => (other === null || k === l ? [] : [Math.abs(other - x)]));
    const strip = Math.min(WIDEST_STRIP * signal.width, (STRIP_OF_PITCH * Math.min(...gaps, width)) / 2);
    const profile = profileLane(signal, x / 2, strip, lines, SAMPLES);
    return profile && presentProfile(profile, lane.spots);
  });
}

/** Through the spots where there are some, else up from the foot. */
function laneX(foot: Point | null, spots: readonly Point[]): number | null {
  if (spots.length === 0) return foot?.x ?? null;
  return spots.reduce((sum, spot) => sum + spot.x, 0) / spots.length;
}

function presentProfile(profile: LaneProfile, spots: readonly { rf: number }[]): ProfiledLane {
  return {
    rf: [...profile.rf],
    signal: [...profile.signal],
    noise: profile.noise,
    areas: measureAreas(
      profile,
      spots.map((spot) => spot.rf),
    ),
  };
}

/** Decodes a photo and measures its lanes. Meant for a worker thread. */
export async function profilePhoto(bytes: Buffer, marks: ProfileMarks): Promise<(ProfiledLane | null)[]> {
  const { autoOrient: whole } = await openPhoto(bytes).metadata();
  const { data, info } = await openPhoto(bytes)
    .resize({ width: WORKING_LONG_PX, height: WORKING_LONG_PX, fit: 'inside', withoutEnlargement: true })
    .removeAlpha()
    .toColourspace('srgb')
    .raw()
    .toBuffer({ resolveWithObject: true });
  const scale = <T extends Point>(p: T): T => ({
    ...p,
    x: (p.x * info.width) / whole.width,
    y: (p.y * info.height) / whole.height,
  });
  return profileLanes(
    { data, width: info.width, height: info.height },
    {
      corners: marks.corners.map(scale),
      baseline: marks.baseline.map(scale),
      front: marks.front.map(scale),
      lanes: marks.lanes.map(({ foot, spots }) => ({ foot: foot && scale(foot), spots: spots.map(scale) })),
    },
  );
}
