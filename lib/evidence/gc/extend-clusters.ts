import { inflectionDistance, type Cluster } from './bounds';
import { meanOf, type RunningSum } from './running-sum';

/** How far from the tail's end the trace may still lie over the baseline, as a share of the peak's height. */
const smallestTailShare = 1e-5;

/**
 * Moves the ends of clusters outwards while short means beyond them still lie over the baseline and still fall: the last of a
 * long tail, which curvature no longer shows. At least `keptPoints` of each stretch without a peak stay.
 */
export function extendClusters(
  clusters: Cluster[],
  running: RunningSum,
  corrected: Float64Array,
  deviation: number,
  keptPoints: number,
): Cluster[] {
  const pointCount = corrected.length;
  const follow = (start: number, direction: -1 | 1, half: number, height: number, limit: number): number => {
    const size = Math.max(1, Math.round(half));
    const least = Math.max((2.5 * deviation) / Math.sqrt(size), smallestTailShare * height);
    const meanFrom = (at: number) =>
      direction > 0 ? meanOf(running, at, at + size) : meanOf(running, at - size, at);
    let at = start;
    let before = Infinity;
    while (direction > 0 ? at + size < limit : at - size > limit) {
      const mean = meanFrom(at);
      if (!(mean > least) || mean > before) break;
      before = mean;
      at += direction * size;
    }
    return at;
  };
  return clusters.map((cluster, k) => {
    const first = cluster.candidates[0]!;
    const last = cluster.candidates[cluster.candidates.length - 1]!;
    const previousEnd = k > 0 ? clusters[k - 1]!.to + keptPoints : keptPoints;
    const nextStart = k + 1 < clusters.length ? clusters[k + 1]!.from - keptPoints : pointCount - keptPoints;
    const from = follow(cluster.from, -1, inflectionDistance(first), corrected[first.apex]!, previousEnd);
    const to = follow(cluster.to, 1, inflectionDistance(last), corrected[last.apex]!, nextStart);
    return { ...cluster, from, to };
  });
}
