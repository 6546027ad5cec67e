import sharp from 'sharp';
import { openPhoto } from '../photo-decoder';
import { findHomography, type Homography } from './homography';
import type { Point } from './polyline';

export type WarpRequest = {
  /** Pixels of the whole photo as shown. */
  corners: Point[];
  width: number;
  height: number;
};

type RawPhoto = { data: Uint8Array; width: number; height: number };

/**
 * The plate between four corners of a photo as if seen from straight above, three bytes a pixel, by the homography of
 * those corners and bilinear sampling. Null where the corners outline no plate. Pure.
 */
export function warpPixels(photo: RawPhoto, corners: readonly Point[], width: number, height: number) {
  const edge = [
    { x: 0, y: 0 },
    { x: width, y: 0 },
    { x: width, y: height },
    { x: 0, y: height },
  ];
  const found = findHomography(edge, corners);
  return found.ok ? sample(photo, found.matrix, width, height) : null;
}

function sample(photo: RawPhoto, [a, b, c, d, e, f, g, h, i]: Homography, width: number, height: number) {
  const out = new Uint8Array(width * height * 3);
  const { data } = photo;
  const row = photo.width * 3;
  for (let y = 0; y < height; y += 1) {
    for (let x = 0; x < width; x += 1) {
      const w = 1 / (g * (x + 0.5) + h * (y + 0.5) + i);
      // A plate that hangs over the border of the photo gets the border's pixels there.
      const u = Math.max(0, Math.min(photo.width - 1.001, (a * (x + 0.5) + b * (y + 0.5) + c) * w - 0.5));
      const v = Math.max(0, Math.min(photo.height - 1.001, (d * (x + 0.5) + e * (y + 0.5) + f) * w - 0.5));
      const [left, top] = [Math.floor(u), Math.floor(v)];
      const [right, down] = [u - left, v - top];
      const at = top * row + left * 3;
      const to = (y * width + x) * 3;
      for (let k = 0; k < 3; k += 1) {
        const p = at + k;
        const upper = data[p]! * (1 - right) + data[p + 3]! * right;
        const lower = data[p + row]! * (1 - right) + data[p + row + 3]! * right;
        out[to + k] = upper * (1 - down) + lower * down + 0.5;
      }
    }
  }
  return out;
}

/** Longest side at which the photo is decoded, in sides of the picture that is asked for: no detail is lost. */
const OVERSAMPLING = 2;

/** Decodes a photo and warps its plate; WebP without metadata. Meant for a worker thread. */
export async function warpPlate(bytes: Buffer, { corners, width, height }: WarpRequest): Promise<Buffer> {
  const { autoOrient: whole } = await openPhoto(bytes).metadata();
  const longest = Math.ceil(OVERSAMPLING * Math.max(width, height));
  const { data, info } = await openPhoto(bytes)
    .resize({ width: longest, height: longest, fit: 'inside', withoutEnlargement: true })
    .removeAlpha()
    .toColourspace('srgb')
    .raw()
    .toBuffer({ resolveWithObject: true });
  const scaled = corners.map(({ x, y }) => ({
    x: (x * info.width) / whole.width,
    y: (y * info.height) / whole.height,
  }));
  const pixels = warpPixels({ data, width: info.width, height: info.height }, scaled, width, height);
  if (!pixels) throw new RangeError('The corners outline no plate.');
  return sharp(pixels, { raw: { width, height, channels: 3 } })
    .webp({ quality: 86 })
    .toBuffer();
}
