import { blur } from './blur';
import { newRaster, robustSpread, type Raster } from './raster';

export type Candidate = {
  x: number;
  y: number;
  /** Standard deviation of the smoothing at which it stands out best, pixels: about that of the spot itself. */
  sigma: number;
  /** How far it stands out, as a difference of two smoothings. */
  response: number;
  /** The same in standard deviations of what the rest of the plate does. */
  toNoise: number;
};

export type ScaleSpace = { sigmas: number[]; smooth: Raster[]; candidates: Candidate[] };

/** Each smoothing is this much wider than the one before. */
const RATIO = 1.45;

/**
 * Blobs of any size: maxima of the differences between one smoothing and the next wider one (scale space:
 * T. Lindeberg, Int. J. Comput. Vision 30, 79 (1998)), as far as they stand out from the unrest of the plate at
 * the same size, measured between two rows. Strongest first; one spot may give several.
 */
export function findBlobs(
  signal: Raster,
  rows: { top: number; bottom: number },
  widestSigma: number,
  least: number,
): ScaleSpace {
  const sigmas: number[] = [];
  for (let sigma = 1.3; sigma <= widestSigma * RATIO || sigmas.length < 4; sigma *= RATIO) sigmas.push(sigma);
  const smooth: Raster[] = [];
  sigmas.forEach((sigma, i) => {
    // From the one before, by what is lacking: variances add up.
    const before = i === 0 ? 0 : sigmas[i - 1]!;
    smooth.push(
      blur(i === 0 ? signal : smooth[i - 1]!, Math.sqrt(sigma * sigma - before * before), i === 0 ? 3 : 2),
    );
  });
  const candidates: Candidate[] = [];
  let unrest = Infinity;
  for (let i = 0; i < sigmas.length - 1; i += 1) {
    const difference = newRaster(signal.width, signal.height);
    for (let k = 0; k < difference.data.length; k += 1)
      difference.data[k] = smooth[i]!.data[k]! - smooth[i + 1]!.data[k]!;
    // Where the unrest seems to rise much with the width of the smoothing, the spots themselves are measured.
    const here = difference.data.subarray(rows.top * signal.width, rows.bottom * signal.width);
    unrest = Math.min(1.3 * unrest, Math.max(1e-3, robustSpread(here).spread));
    collectMaxima(difference, sigmas[i]!, unrest, least, candidates);
  }
  candidates.sort((a, b) => b.response - a.response);
  return { sigmas, smooth, candidates };
}

function collectMaxima(raster: Raster, sigma: number, spread: number, least: number, into: Candidate[]) {
  const { width, height, data } = raster;
  for (let y = 1; y < height - 1; y += 1) {
    for (let x = 1; x < width - 1; x += 1) {
      const at = y * width + x;
      const here = data[at]!;
      if (here < least * spread) continue;
      if (here < data[at - 1]! || here <= data[at + 1]!) continue;
      if (here < data[at - width]! || here <= data[at + width]!) continue;
      if (here < data[at - width - 1]! || here < data[at - width + 1]!) continue;
      if (here <= data[at + width - 1]! || here <= data[at + width + 1]!) continue;
      into.push({ x: x + 0.5, y: y + 0.5, sigma, response: here, toNoise: here / spread });
    }
  }
}
