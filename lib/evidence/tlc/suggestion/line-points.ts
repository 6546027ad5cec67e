import type { Point } from '../polyline';

/**
 * The chain of straight pieces with knots at the given places that comes nearest to the points: least squares on
 * hat functions, repeated with weights by Tukey's biweight so that strokes that belong to no line have no say.
 * Null if the points do not determine it.
 */
export function fitChain(
  points: readonly (Point & { weight: number })[],
  knots: readonly number[],
): { line: Point[]; spread: number } | null {
  let trust = points.map((p) => p.weight);
  let heights: number[] | null = null;
  let spread = 0;
  for (let round = 0; round < 6; round += 1) {
    heights = solveHats(points, trust, knots);
    if (!heights) return null;
    const off = points.map((p) => Math.abs(p.y - chainAt(knots, heights!, p.x)));
    spread = 1.4826 * [...off].sort((a, b) => a - b)[off.length >> 1]!;
    const width = 4.685 * Math.max(spread, 0.3);
    trust = points.map((p, i) => (off[i]! < width ? p.weight * (1 - (off[i]! / width) ** 2) ** 2 : 0));
  }
  return { line: knots.map((x, i) => ({ x, y: heights![i]! })), spread };
}

function chainAt(knots: readonly number[], heights: readonly number[], x: number): number {
  const i = pieceOf(knots, x);
  const share = (x - knots[i]!) / (knots[i + 1]! - knots[i]!);
  return heights[i]! + share * (heights[i + 1]! - heights[i]!);
}

function pieceOf(knots: readonly number[], x: number): number {
  let i = 0;
  while (i < knots.length - 2 && x > knots[i + 1]!) i += 1;
  return i;
}

/** Normal equations of the hat functions, a band of three, solved from one end to the other. */
function solveHats(points: readonly Point[], weights: readonly number[], knots: readonly number[]) {
  const n = knots.length;
  const diagonal = new Array<number>(n).fill(1e-9);
  const beside = new Array<number>(n).fill(0);
  const right = new Array<number>(n).fill(0);
  points.forEach((p, k) => {
    const i = pieceOf(knots, p.x);
    const share = (p.x - knots[i]!) / (knots[i + 1]! - knots[i]!);
    const w = weights[k]!;
    diagonal[i]! += w * (1 - share) ** 2;
    diagonal[i + 1]! += w * share ** 2;
    beside[i]! += w * share * (1 - share);
    right[i]! += w * (1 - share) * p.y;
    right[i + 1]! += w * share * p.y;
  });
  for (let i = 1; i < n; i += 1) {
    if (diagonal[i - 1]! < 1e-6) return null;
    const factor = beside[i - 1]! / diagonal[i - 1]!;
    diagonal[i]! -= factor * beside[i - 1]!;
    right[i]! -= factor * right[i - 1]!;
  }
  if (diagonal[n - 1]! < 1e-6) return null;
  const heights = new Array<number>(n).fill(0);
  for (let i = n - 1; i >= 0; i -= 1)
    heights[i] = (right[i]! - (i < n - 1 ? beside[i]! * heights[i + 1]! : 0)) / diagonal[i]!;
  return heights;
}

/**
 * A line in as few points as do it justice: 2, 3 or 5, more only where they bring the line clearly nearer
 * (by a third, and by more than a quarter of a pixel).
 */
export function simplifyLine(
  points: readonly (Point & { weight: number })[],
): { line: Point[]; spread: number } | null {
  const left = Math.min(...points.map((p) => p.x));
  const right = Math.max(...points.map((p) => p.x));
  let best: { line: Point[]; spread: number } | null = null;
  for (const count of [2, 3, 5]) {
    if (points.length < 4 * count) break;
    const knots = Array.from({ length: count }, (_, i) => left + ((right - left) * i) / (count - 1));
    const fit = fitChain(points, knots);
    if (fit && (!best || (fit.spread < 0.67 * best.spread && fit.spread < best.spread - 0.25))) best = fit;
  }
  return best;
}
