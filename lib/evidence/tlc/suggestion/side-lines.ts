import type { Point } from '../polyline';
import type { RawPhoto } from './raster';
import { lineThrough, meet, type Line } from './quadrilateral';

export type RefinedSide = {
  line: Line;
  /** Share of places at which the edge is seen on the line. */ support: number;
};

/** Least step between plate and table to be called an edge, levels. */
const LEAST_STEP = 7;
/** Share of the step that must last beyond the thickness of a drawn line. */
const LASTING = 0.4;

/**
 * Moves a roughly known side of the plate onto the edge in the photo. At many places along it the sharpest step
 * of colour across it is looked for, `reach` pixels to both sides; a line is then fitted by least squares that
 * count a place the less the further it lies off (weights by Tukey's biweight), so that dust, chips and
 * shadows have no say.
 */
export function refineSide(photo: RawPhoto, from: Point, to: Point, reach: number): RefinedSide {
  const { direction } = lineThrough(from, to);
  const normal = { x: -direction.y, y: direction.x };
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  const places: { t: number; off: number; step: number }[] = [];
  const count = 64;
  let inside = 0;
  for (let i = 0; i < count; i += 1) {
    const t = length * (0.04 + (0.92 * (i + 0.5)) / count);
    const at = { x: from.x + t * direction.x, y: from.y + t * direction.y };
    if (at.x < 0 || at.y < 0 || at.x >= photo.width || at.y >= photo.height) continue;
    inside += 1;
    const step = sharpestStep(photo, at, direction, normal, reach);
    if (step) places.push({ t, ...step });
  }
  const seen = places.filter((p) => p.step >= LEAST_STEP);
  if (seen.length < 12) return { line: lineThrough(from, to), support: 0 };
  let fit = { offset: median(seen.map((p) => p.off)), slope: 0 };
  for (const width of [reach, reach / 2, 4, 3, 3]) fit = weightedLine(seen, fit, width);
  const on = seen.filter((p) => Math.abs(p.off - fit.offset - fit.slope * (p.t - length / 2)) <= 1.5).length;
  const end = (t: number): Point => {
    const off = fit.offset + fit.slope * (t - length / 2);
    return { x: from.x + t * direction.x + off * normal.x, y: from.y + t * direction.y + off * normal.y };
  };
  return { line: lineThrough(end(0), end(length)), support: on / Math.max(24, inside) };

  function weightedLine(list: typeof seen, old: typeof fit, width: number) {
    let [w, wt, wo, wtt, wto] = [0, 0, 0, 0, 0];
    for (const p of list) {
      const t = p.t - length / 2;
      const off = (p.off - old.offset - old.slope * t) / width;
      if (Math.abs(off) >= 1) continue;
      const weight = (1 - off * off) ** 2;
      w += weight;
      wt += weight * t;
      wo += weight * p.off;
      wtt += weight * t * t;
      wto += weight * t * p.off;
    }
    const spread = w * wtt - wt * wt;
    if (w < 1e-6 || spread < 1e-6) return old;
    const slope = (w * wto - wt * wo) / spread;
    return { slope, offset: (wo - slope * wt) / w };
  }
}

function median(values: number[]): number {
  return [...values].sort((a, b) => a - b)[values.length >> 1]!;
}

/** The place across the side where three pixels on one hand differ most from three on the other. */
function sharpestStep(photo: RawPhoto, at: Point, direction: Point, normal: Point, reach: number) {
  const n = 2 * reach + 1;
  const line = new Float32Array(n * 3);
  for (let i = 0; i < n; i += 1) {
    for (const along of [-1.5, 0, 1.5]) {
      const x = Math.round(at.x + (i - reach) * normal.x + along * direction.x - 0.5);
      const y = Math.round(at.y + (i - reach) * normal.y + along * direction.y - 0.5);
      if (x < 0 || y < 0 || x >= photo.width || y >= photo.height) return null;
      const from = (y * photo.width + x) * 3;
      for (let c = 0; c < 3; c += 1) line[i * 3 + c]! += photo.data[from + c]! / 3;
    }
  }
  const steps = new Float32Array(n);
  let best = 3;
  for (let i = 3; i <= n - 3; i += 1) {
    let sum = 0;
    for (let c = 0; c < 3; c += 1) {
      let change = 0;
      for (let k = 0; k < 3; k += 1) change += line[(i + k) * 3 + c]! - line[(i - 1 - k) * 3 + c]!;
      sum += (change / 3) ** 2;
    }
    steps[i] = Math.sqrt(sum);
    if (steps[i]! > steps[best]!) best = i;
  }
  // Pixel i begins half a pixel before its centre: the step lies between pixels i - 1 and i.
  const [a, b, c] = [steps[best - 1] ?? 0, steps[best]!, steps[best + 1] ?? 0];
  const bend = a - 2 * b + c;
  const shift = bend < -1e-6 ? Math.max(-0.5, Math.min(0.5, (0.5 * (a - c)) / bend)) : 0;
  // An edge stands out from the unrest about it; the unrest of an even ground does not.
  const unrest = median([...steps.subarray(3, n - 2)]);
  return b >= 2.5 * unrest && lastingStep(line, best) >= LASTING * b
    ? { off: best - reach - 0.5 + shift, step: b }
    : null;
}

/** How much the colours well beyond a place differ from those well before it: nothing at a mere pencil line. */
function lastingStep(line: Float32Array, at: number): number {
  const n = line.length / 3;
  const mean = (first: number, last: number, c: number) => {
    const [from, to] = [Math.max(0, Math.min(n - 2, first)), Math.min(n - 1, Math.max(1, last))];
    let sum = 0;
    for (let i = from; i <= to; i += 1) sum += line[i * 3 + c]!;
    return sum / (to - from + 1);
  };
  const changes = [0, 1, 2].map((c) => mean(at + 6, at + 10, c) - mean(at - 11, at - 7, c));
  return Math.hypot(...changes);
}

/** Corners where neighbouring sides meet; sides in the order top, right, bottom, left. Null if two are parallel. */
export function cornersOf(sides: readonly Line[]): Point[] | null {
  const corners = [0, 1, 2, 3].map((i) => meet(sides[(i + 3) % 4]!, sides[i]!));
  return corners.every((corner) => corner !== null) ? (corners as Point[]) : null;
}
