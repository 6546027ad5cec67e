import sharp from 'sharp';
import { type DemoSpot, type DemoVisualiser, PHOTO } from './plate-layout';
import { chanceFor } from './random';

type Colour = readonly [number, number, number];

/** How a plate looks under a visualiser: its ground, its spots, and what lies around it. */
const LOOK: Readonly<Record<DemoVisualiser, { ground: Colour; spot: Colour; around: Colour }>> = {
  // The indicator glows green under 254 nm, and a compound that absorbs there leaves a dark spot.
  'uv-254': { ground: [86, 190, 104], spot: [38, 44, 74], around: [10, 12, 16] },
  // Permanganate is purple and turns yellow-brown where it is reduced.
  permanganate: { ground: [203, 142, 168], spot: [176, 136, 46], around: [228, 226, 220] },
};

/** Five columns by seven rows a letter, a bit a point: enough to say what the picture is. */
const LETTERS: Readonly<Record<string, readonly number[]>> = {
  I: [14, 4, 4, 4, 4, 4, 14],
  N: [17, 25, 21, 19, 17, 17, 17],
  V: [17, 17, 17, 17, 10, 10, 4],
  E: [31, 16, 16, 30, 16, 16, 31],
  T: [31, 4, 4, 4, 4, 4, 4],
  D: [30, 17, 17, 17, 17, 17, 30],
};
const POINT_PX = 4;

function isInWord(word: string, x: number, y: number): boolean {
  const letter = LETTERS[word[Math.floor(x / (6 * POINT_PX))] ?? ''];
  const column = Math.floor((x % (6 * POINT_PX)) / POINT_PX);
  const row = letter?.[Math.floor(y / POINT_PX)];
  return x >= 0 && y >= 0 && row !== undefined && column < 5 && (row & (16 >> column)) !== 0;
}

/** Share of the spot's colour at a point: soft-edged, a little taller below, as spots run. */
function spotAt(spots: readonly DemoSpot[], x: number, y: number): number {
  let share = 0;
  for (const spot of spots) {
    const dx = (x - spot.x) / 24;
    const dy = (y - spot.y) / (y > spot.y ? 21 : 17);
    const distance = dx * dx + dy * dy;
    if (distance < 9) share = Math.max(share, spot.strength * Math.exp(-0.5 * distance ** 1.6));
  }
  return share;
}

/**
 * A photo of an invented plate as JPEG: the ground of its visualiser, uneven light, pencil lines, spots, some noise of
 * the camera, and the word INVENTED on it. Drawn point by point; the same key gives the same picture.
 */
export async function drawPlate(
  key: string,
  visualiser: DemoVisualiser,
  spots: readonly DemoSpot[],
): Promise<Buffer> {
  const { widthPx, heightPx, marginPx, baselineY, frontY } = PHOTO;
  const { ground, spot, around } = LOOK[visualiser];
  const chance = chanceFor(`photo ${key} ${visualiser}`);
  const lamp = { x: widthPx * (0.4 + 0.2 * chance.uniform()), y: heightPx * (0.35 + 0.2 * chance.uniform()) };
  const pixels = Buffer.alloc(widthPx * heightPx * 3);
  for (let y = 0; y < heightPx; y += 1) {
    for (let x = 0; x < widthPx; x += 1) {
      const onPlate = x >= marginPx && x < widthPx - marginPx && y >= marginPx && y < heightPx - marginPx;
      const light = 1.05 - 0.28 * (((x - lamp.x) / widthPx) ** 2 + ((y - lamp.y) / heightPx) ** 2) * 2;
      const grain = 5 * (chance.uniform() - 0.5);
      const share = onPlate ? spotAt(spots, x, y) : 0;
      const pencil = onPlate && (Math.abs(y - baselineY) < 2 || Math.abs(y - frontY) < 1) ? 0.72 : 1;
      const written = isInWord('INVENTED', x - marginPx - 24, y - marginPx - 22) ? 0.6 : 1;
      for (let band = 0; band < 3; band += 1) {
        const base = onPlate ? ground[band]! * (1 - share) + spot[band]! * share : around[band]!;
        const value = base * light * pencil * written + grain;
        pixels[(y * widthPx + x) * 3 + band] = Math.max(0, Math.min(255, Math.round(value)));
      }
    }
  }
  return sharp(pixels, { raw: { width: widthPx, height: heightPx, channels: 3 } })
    .jpeg({ quality: 88 })
    .toBuffer();
}
