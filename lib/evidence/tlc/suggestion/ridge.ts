import { newRaster, robustSpread, type Raster } from './raster';

/**
 * How much each place looks like a thin line across the plate, in standard deviations: darker (or paler) than
 * what lies a little above and a little below it, whichever of the two differs less, so that a mere edge counts
 * for nothing. Columns are taken together `binWidth` at a time, which a slanting line bears and noise does not.
 */
export function ridgeStrength(
  plate: Raster,
  binWidth: number,
  reach: number,
): { dark: Raster; pale: Raster } {
  const bins = Math.floor(plate.width / binWidth);
  const { height } = plate;
  const mean = newRaster(bins, height);
  for (let y = 0; y < height; y += 1) {
    for (let x = 0; x < bins * binWidth; x += 1)
      mean.data[y * bins + ((x / binWidth) | 0)]! += plate.data[y * plate.width + x]! / binWidth;
  }
  const dark = newRaster(bins, height);
  const pale = newRaster(bins, height);
  const three = (at: number) => (mean.data[at - bins]! + mean.data[at]! + mean.data[at + bins]!) / 3;
  for (let y = reach + 1; y < height - reach - 1; y += 1) {
    for (let x = 0; x < bins; x += 1) {
      const at = y * bins + x;
      const centre = (mean.data[at - bins]! + 2 * mean.data[at]! + mean.data[at + bins]!) / 4;
      const above = three(at - reach * bins);
      const below = three(at + reach * bins);
      dark.data[at] = Math.min(above, below) - centre;
      pale.data[at] = centre - Math.max(above, below);
    }
  }
  // Noise from the difference of the two: near zero on the bulk of the plate.
  const difference = dark.data.map((v, i) => (v - pale.data[i]!) / 2);
  const { spread } = robustSpread(difference);
  const unit = 1 / Math.max(spread, 0.0015);
  for (const raster of [dark, pale]) for (let i = 0; i < raster.data.length; i += 1) raster.data[i]! *= unit;
  return { dark, pale };
}
