import sharp from 'sharp';
import type { Homography } from '@/lib/evidence/tlc/homography';
import type { Point } from '@/lib/evidence/tlc/polyline';
import type { Canvas } from './canvas';
import type { Colour } from './plate-scene';
import { seededRandom } from './random';
import { disturb, type Trouble } from './troubles';

export type Exposure = {
  width: number;
  height: number;
  /** Share of light lost from one side of the photo to the other. */
  unevenLight: number;
  /** Direction of that loss, degrees. */
  lightDeg: number;
  /** Standard deviation of the noise of one pixel, levels. */
  noise: number;
  /** Standard deviation of the blur, pixels. */
  blurPx: number;
  quality: number;
};

/** Light that reaches a place of the photo, about 1 in the middle. */
export function lightAt(exposure: Exposure, x: number, y: number): number {
  const u = x / exposure.width - 0.5;
  const v = y / exposure.height - 0.5;
  const angle = (exposure.lightDeg * Math.PI) / 180;
  return 1 - exposure.unevenLight * (u * Math.cos(angle) + v * Math.sin(angle)) - 0.12 * (u * u + v * v);
}

/** Puts the plate on a table and takes it: perspective, light, blur and noise. Three bytes a pixel. */
export async function photograph(
  plate: Canvas,
  toPlate: Homography,
  table: Colour,
  exposure: Exposure,
  scene: { seed: number; troubles?: readonly Trouble[]; corners: readonly Point[] },
): Promise<Buffer> {
  const { width, height } = exposure;
  const random = seededRandom(scene.seed + 991);
  const sharpPicture = Buffer.alloc(width * height * 3);
  const [a, b, c, d, e, f, g, h, i] = toPlate;
  for (let y = 0; y < height; y += 1) {
    for (let x = 0; x < width; x += 1) {
      const w = g * (x + 0.5) + h * (y + 0.5) + i;
      const u = (a * (x + 0.5) + b * (y + 0.5) + c) / w - 0.5;
      const v = (d * (x + 0.5) + e * (y + 0.5) + f) / w - 0.5;
      const light = lightAt(exposure, x, y);
      const at = (y * width + x) * 3;
      const off = u < -0.5 || v < -0.5 || u >= plate.width - 0.5 || v >= plate.height - 0.5;
      const left = Math.min(plate.width - 2, Math.max(0, Math.floor(u)));
      const top = Math.min(plate.height - 2, Math.max(0, Math.floor(v)));
      const from = (top * plate.width + left) * 3;
      const row = plate.width * 3;
      for (let k = 0; k < 3; k += 1) {
        let level = table[k]! * (1 + 0.05 * Math.sin(x * 0.021 + 2 * Math.sin(y * 0.013)));
        if (!off) {
          const p = from + k;
          const upper = plate.data[p]! + (u - left) * (plate.data[p + 3]! - plate.data[p]!);
          const lower = plate.data[p + row]! + (u - left) * (plate.data[p + row + 3]! - plate.data[p + row]!);
          level = upper + (v - top) * (lower - upper);
        }
        sharpPicture[at + k] = Math.max(0, Math.min(255, level * light + 0.5));
      }
    }
  }
  for (const trouble of scene.troubles ?? [])
    disturb(trouble, { pixels: sharpPicture, exposure, corners: scene.corners, random });
  const picture = sharp(sharpPicture, { raw: { width, height, channels: 3 } });
  const blurred = exposure.blurPx > 0.3 ? await picture.blur(exposure.blurPx).raw().toBuffer() : sharpPicture;
  // A table of noise, read from a changing place, is as good as fresh noise and quick at 12 megapixels.
  const noise = Float32Array.from({ length: 65_537 }, () => random.normal() * exposure.noise);
  let at = 0;
  for (let p = 0; p < blurred.length; p += 1) {
    if (p % 4096 === 0) at = random.whole(0, 65_536);
    at = at === 65_536 ? 0 : at + 1;
    blurred[p] = Math.max(0, Math.min(255, blurred[p]! + noise[at]! + 0.5));
  }
  return blurred;
}

/** How pixels must lie in the file for a viewer that obeys the EXIF orientation (1 to 8) to show them upright. */
export async function encodeTurned(pixels: Buffer, exposure: Exposure, orientation: number): Promise<Buffer> {
  const { width, height, quality } = exposure;
  const shown = sharp(pixels, { raw: { width, height, channels: 3 } });
  // Undoing each orientation: mirrored ones are flopped first, quarter turns are turned back.
  const turn = [0, 0, 0, 180, 180, 270, 270, 90, 90][orientation]!;
  const mirrored = [2, 4, 5, 7].includes(orientation);
  let stored = shown;
  if (mirrored) {
    const flopped = await shown.flop().raw().toBuffer();
    stored = sharp(flopped, { raw: { width, height, channels: 3 } });
  }
  if (turn) stored = stored.rotate(turn);
  if (orientation !== 1) stored = stored.withMetadata({ orientation });
  return stored.jpeg({ quality, chromaSubsampling: '4:2:0' }).toBuffer();
}
