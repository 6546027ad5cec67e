import { curvatureAt, curvatureNoiseGain } from './curvature';
import type { Candidate } from './detect-peaks';
import { quantileInPlace } from './quantile';

/** Peaks that share one stretch of the trace. Points from..to, to not included; candidates in order of time. */
export interface Cluster {
  from: number;
  to: number;
  candidates: Candidate[];
}

/** Distance from apex to inflection, points: about one standard deviation of a Gaussian peak. At least one point. */
export function inflectionDistance(candidate: Candidate): number {
  return Math.max(1, (candidate.to - candidate.from + 1) / 2);
}

/** Tails are followed until their curvature is lost in the noise, or is this small against the apex's own. */
const smallestCurvatureShare = 2e-5;

const sampleLimit = 4_000;

/**
 * Curvature that each level has away from peaks: noise, and the bend of a drifting baseline. 60 % of the sampled points lie under
 * the quantile taken, which for pure noise times 2.4 is two standard deviations. Zero where peaks leave too little.
 */
export function curvatureAwayFromPeaks(levels: Float64Array[], candidates: Candidate[]): Float64Array {
  const away = new Float64Array(levels.length);
  const scratch = new Float64Array(sampleLimit + 1);
  levels.forEach((points, level) => {
    const size = 2 ** level;
    const stride = Math.max(1, Math.ceil(points.length / sampleLimit));
    let next = 0;
    let count = 0;
    let busyUntil = -1;
    for (let i = 2; i < points.length - 2; i += stride) {
      const at = i * size;
      while (next < candidates.length) {
        const candidate = candidates[next]!;
        const reach = 5 * inflectionDistance(candidate) + 2 * size;
        if (at < candidate.apex - reach) break;
        busyUntil = Math.max(busyUntil, candidate.apex + reach + 3 * inflectionDistance(candidate));
        next++;
      }
      if (at > busyUntil) scratch[count++] = Math.abs(curvatureAt(points, i));
    }
    away[level] = count * stride > 0.1 * points.length ? 2.4 * quantileInPlace(scratch, 0.6, count) : 0;
  });
  return away;
}

function walkOut(
  levels: Float64Array[],
  levelDeviation: Float64Array,
  quietCurvature: Float64Array,
  candidate: Candidate,
  direction: -1 | 1,
  limit: number,
): number {
  const half = inflectionDistance(candidate);
  const apexCurvature = candidate.strength * levelDeviation[candidate.level]! * curvatureNoiseGain;
  let position = candidate.apex + direction * 3 * half;
  const beyond = (point: number) => (direction > 0 ? point >= limit : point <= limit);
  // A coarser level would see the peak itself in its tail.
  const lastLevel = Math.min(levels.length - 1, Math.max(candidate.level, Math.floor(Math.log2(1.5 * half))));
  let turned = false;
  for (let level = candidate.level; level <= lastLevel && !beyond(position) && !turned; level++) {
    const size = 2 ** level;
    if (level > candidate.level && Math.abs(limit - position) < 6 * size) break;
    const points = levels[level]!;
    const quietUnder = Math.max(
      2 * levelDeviation[level]! * curvatureNoiseGain,
      quietCurvature[level]!,
      smallestCurvatureShare * apexCurvature * 4 ** (level - candidate.level),
    );
    let i = Math.floor(position / size);
    let quiet = 0;
    let smallest = Infinity;
    let smallestAt = i;
    while (quiet < 3 && i >= 2 && i < points.length - 2 && !beyond(i * size)) {
      const curvature = curvatureAt(points, i);
      quiet = Math.abs(curvature) < quietUnder ? quiet + 1 : 0;
      // A flank only straightens outwards; where it bends again, or the other way, something else begins.
      if (curvature < -2 * quietUnder || curvature > 2 * smallest + 2 * quietUnder) {
        turned = true;
        i = smallestAt;
        quiet = 0;
        break;
      }
      if (curvature < smallest) {
        smallest = Math.max(0, curvature);
        smallestAt = i;
      }
      i += direction;
    }
    const reached = (i - direction * quiet) * size;
    if (direction > 0 ? reached > position : reached < position) position = reached;
  }
  return Math.round(turned ? position : position + direction * half);
}

/**
 * Extent of each peak, by following its flanks outwards while the trace is curved more than the noise
 * (a straight drift is not, so it neither shortens nor lengthens a peak), and the clusters of peaks whose
 * extents touch. In order of time.
 */
export function findClusters(
  levels: Float64Array[],
  levelDeviation: Float64Array,
  candidates: Candidate[],
): Cluster[] {
  const pointCount = levels[0]!.length;
  const quietCurvature = curvatureAwayFromPeaks(levels, candidates);
  const clusters: Cluster[] = [];
  candidates.forEach((candidate, k) => {
    const before = k > 0 ? candidates[k - 1]!.to : 0;
    const after = k + 1 < candidates.length ? candidates[k + 1]!.from : pointCount;
    const from = Math.max(0, walkOut(levels, levelDeviation, quietCurvature, candidate, -1, before));
    const to = Math.min(pointCount, walkOut(levels, levelDeviation, quietCurvature, candidate, 1, after));
    let joined: Cluster = { from, to, candidates: [candidate] };
    const shortestGap = Math.max(3, Math.round(inflectionDistance(candidate)));
    while (clusters.length > 0 && joined.from - clusters[clusters.length - 1]!.to < shortestGap) {
      const last = clusters.pop()!;
      joined = {
        from: Math.min(last.from, joined.from),
        to: Math.max(last.to, joined.to),
        candidates: [...last.candidates, ...joined.candidates],
      };
    }
    if (joined.from < 3) joined.from = 0;
    if (joined.to > pointCount - 3) joined.to = pointCount;
    clusters.push(joined);
  });
  return clusters;
}

/** Stretches without a peak, between the clusters. */
export function gapsBetween(clusters: Cluster[], pointCount: number): { from: number; to: number }[] {
  const gaps: { from: number; to: number }[] = [];
  let from = 0;
  for (const cluster of clusters) {
    if (cluster.from > from) gaps.push({ from, to: cluster.from });
    from = Math.max(from, cluster.to);
  }
  if (from < pointCount) gaps.push({ from, to: pointCount });
  return gaps;
}
