import type { Point } from '@/lib/evidence/tlc/polyline';
import type { Exposure } from './photograph';
import type { Random } from './random';

/** What happens at a bench beside the plate itself. */
export const troubles = [
  'glare of a lamp',
  'shadow of a hand',
  'chipped corner',
  'tweezers over an edge',
  'grained table',
  'lamp in the middle only',
] as const;
export type Trouble = (typeof troubles)[number];

type Picture = { pixels: Buffer; exposure: Exposure; corners: readonly Point[]; random: Random };

const between = (a: Point, b: Point, share: number): Point => ({
  x: a.x + share * (b.x - a.x),
  y: a.y + share * (b.y - a.y),
});

/** Puts a trouble into a picture of levels, before blur and noise. */
export function disturb(trouble: Trouble, picture: Picture) {
  const { pixels, exposure, corners, random } = picture;
  const { width, height } = exposure;
  const [topLeft, topRight, bottomRight, bottomLeft] = corners as [Point, Point, Point, Point];
  const unit = Math.hypot(topRight.x - topLeft.x, topRight.y - topLeft.y);
  const each = (change: (x: number, y: number, level: number, channel: number) => number) => {
    for (let y = 0; y < height; y += 1)
      for (let x = 0; x < width; x += 1)
        for (let c = 0; c < 3; c += 1) {
          const at = (y * width + x) * 3 + c;
          pixels[at] = Math.max(0, Math.min(255, change(x, y, pixels[at]!, c)));
        }
  };
  const inside = (p: Point) => {
    const turn = (a: Point, b: Point) => (b.x - a.x) * (p.y - a.y) - (b.y - a.y) * (p.x - a.x);
    return corners.every((corner, i) => turn(corner, corners[(i + 1) % 4]!) > 0);
  };
  switch (trouble) {
    case 'glare of a lamp': {
      const at = between(
        between(topLeft, topRight, random.between(0.2, 0.8)),
        bottomLeft,
        random.between(0.2, 0.6),
      );
      const size = 0.35 * unit;
      each((x, y, level) => level + 45 * Math.exp(-((x - at.x) ** 2 + (y - at.y) ** 2) / (2 * size * size)));
      return;
    }
    case 'shadow of a hand': {
      const a = between(topLeft, bottomLeft, random.between(0.3, 0.7));
      const b = between(topRight, bottomRight, random.between(0.3, 0.7));
      each((x, y, level) => {
        const off = ((b.x - a.x) * (y - a.y) - (b.y - a.y) * (x - a.x)) / Math.hypot(b.x - a.x, b.y - a.y);
        return level * (1 - 0.25 / (1 + Math.exp(-off / (0.12 * unit))));
      });
      return;
    }
    case 'chipped corner': {
      const size = 0.09 * unit;
      const table = [...pixels.subarray(0, 3)];
      each((x, y, level, c) => (Math.hypot(x - topRight.x, y - topRight.y) < size ? table[c]! : level));
      return;
    }
    case 'tweezers over an edge': {
      const at = between(topLeft, topRight, random.between(0.3, 0.7));
      const half = 0.05 * unit;
      each((x, y, level) => (Math.abs(x - at.x) < half && y < at.y + 0.06 * unit ? 90 + 0.2 * level : level));
      return;
    }
    case 'grained table':
      each((x, y, level) =>
        inside({ x, y }) ? level : level * (0.85 + 0.3 * Math.sin(0.09 * y + 3 * Math.sin(x * 0.004))),
      );
      return;
    case 'lamp in the middle only':
      each((x, y, level) => level * (1.1 - 1.1 * ((x / width - 0.5) ** 2 + (y / height - 0.5) ** 2)));
  }
}
