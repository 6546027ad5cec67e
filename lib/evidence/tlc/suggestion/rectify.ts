import { applyHomography, findHomography, type Homography } from '../homography';
import type { Point } from '../polyline';
import { newRaster, type Raster, type RawPhoto } from './raster';

/** The plate alone, seen from straight above: one raster a channel of ln(level + 8). */
export type FlatPlate = {
  channels: readonly [Raster, Raster, Raster];
  width: number;
  height: number;
  /** From pixels of the flat plate to pixels of the photo. */
  toPhoto: Homography;
};

/** Pixels of the flat plate at most: enough for a tenth of a millimetre or two, and quick. */
const MOST_PIXELS = 260_000;

/** Added to a level before the logarithm, so that noise in the dark stays finite. */
export const DARK_OFFSET = 8;

const logarithms = Float32Array.from({ length: 256 }, (_, level) => Math.log(level + DARK_OFFSET));

/**
 * Carries the plate between four corners onto a rectangle by the homography of those corners. Its sides are the
 * mean lengths of the sides seen, hardly finer than the photo. The logarithm turns uneven light into a sum.
 * Null where the corners outline no plate.
 */
export function rectify(photo: RawPhoto, corners: readonly Point[]): FlatPlate | null {
  const side = (i: number, k: number) =>
    Math.hypot(corners[i]!.x - corners[k]!.x, corners[i]!.y - corners[k]!.y);
  const across = (side(0, 1) + side(3, 2)) / 2;
  const along = (side(0, 3) + side(1, 2)) / 2;
  const scale = Math.min(1.6, Math.sqrt(MOST_PIXELS / (across * along)));
  const width = Math.round(across * scale);
  const height = Math.round(along * scale);
  if (!(width >= 24 && height >= 24)) return null;
  const found = findHomography(
    [
      { x: 0, y: 0 },
      { x: width, y: 0 },
      { x: width, y: height },
      { x: 0, y: height },
    ],
    corners,
  );
  if (!found.ok) return null;
  const channels = [0, 1, 2].map(() => newRaster(width, height)) as unknown as FlatPlate['channels'];
  sample(photo, found.matrix, channels);
  return { channels, width, height, toPhoto: found.matrix };
}

function sample(photo: RawPhoto, [a, b, c, d, e, f, g, h, i]: Homography, channels: FlatPlate['channels']) {
  const { width, height } = channels[0];
  const { data } = photo;
  const row = photo.width * 3;
  for (let y = 0; y < height; y += 1) {
    for (let x = 0; x < width; x += 1) {
      const w = 1 / (g * (x + 0.5) + h * (y + 0.5) + i);
      // A plate that hangs over the border of the photo gets the border's pixels there.
      const u = Math.max(0, Math.min(photo.width - 1.001, (a * (x + 0.5) + b * (y + 0.5) + c) * w - 0.5));
      const v = Math.max(0, Math.min(photo.height - 1.001, (d * (x + 0.5) + e * (y + 0.5) + f) * w - 0.5));
      const left = Math.floor(u);
      const top = Math.floor(v);
      const right = u - left;
      const down = v - top;
      const at = top * row + left * 3;
      const to = y * width + x;
      for (let k = 0; k < 3; k += 1) {
        const p = at + k;
        const upper = logarithms[data[p]!]! * (1 - right) + logarithms[data[p + 3]!]! * right;
        const lower = logarithms[data[p + row]!]! * (1 - right) + logarithms[data[p + row + 3]!]! * right;
        channels[k]!.data[to] = upper * (1 - down) + lower * down;
      }
    }
  }
}

/** A place on the flat plate in pixels of the photo. */
export function toPhotoPoint(plate: FlatPlate, point: Point): Point {
  return applyHomography(plate.toPhoto, point);
}
