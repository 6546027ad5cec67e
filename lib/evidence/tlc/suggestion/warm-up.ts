import type { RawPhoto } from './raster';
import { suggestPlate } from './suggest-plate';

/** After so many plates the compiler has made its best of the code. */
const ROUNDS = 6;

/** Looks at a drawn plate a few times, so that the first real photo does not wait for the code to be compiled. */
export function warmUp() {
  const photo = drawPlate(750, 1000);
  for (let round = 0; round < ROUNDS; round += 1) suggestPlate(photo);
}

/** A green plate on a dark table with baseline, front and six spots; a little unrest instead of noise. */
function drawPlate(width: number, height: number): RawPhoto {
  const data = new Uint8Array(width * height * 3);
  for (let y = 0; y < height; y += 1) {
    for (let x = 0; x < width; x += 1) {
      const onPlate = x > 150 && x < 600 && y > 60 && y < 940;
      const onLine = Math.abs(y - 840 - 0.02 * x) < 2 || Math.abs(y - 150) < 2;
      const across = ((x - 150) % 150) - 75;
      const along = ((y - 300) % 250) - 125;
      const spot = y > 300 && y < 800 ? 0.6 * Math.exp(-(across * across + along * along) / 400) : 0;
      const light = (onPlate ? 1 : 0.15) * (onLine ? 0.6 : 1 - spot);
      const unrest = ((x * 7919 + y * 104729) % 13) - 6;
      const at = (y * width + x) * 3;
      data[at] = Math.max(0, 95 * light + unrest);
      data[at + 1] = Math.max(0, 200 * light + unrest);
      data[at + 2] = Math.max(0, 120 * light + unrest);
    }
  }
  return { data, width, height };
}
