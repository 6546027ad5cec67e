import { curvatureAt, curvatureNoiseGain } from './curvature';

/** A concave stretch of the trace: the top of a peak or a shoulder. Indices are points of the full trace. */
export interface Candidate {
  apex: number;
  /** Where the curvature changes sign on both sides of the apex (inflection points of the peak). */
  from: number;
  to: number;
  /** Pyramid level at which it stands out most, and by how many standard deviations. */
  level: number;
  strength: number;
}

/** A concave stretch must stand out this far: of a million points of pure noise none is expected to. */
const concaveThreshold = 6;
/** Two tops at one level are two only if the stretch between them is convex by this much. */
const convexThreshold = 3.5;

/** From here on noise hardly moves the inflection points; a coarser level would only blur them. */
const clearStrength = 40;

/** Concave stretches of one level, in units of that level's own curvature noise. */
function concaveStretches(points: Float64Array, level: number, deviation: number): Candidate[] {
  const found: Candidate[] = [];
  const unit = 1 / (deviation * curvatureNoiseGain);
  const size = 2 ** level;
  let best = -1;
  let bestStrength = 0;
  let inside = false;
  const close = () => {
    if (best < 0) return;
    let from = best;
    let to = best;
    while (from > 2 && curvatureAt(points, from - 1) < 0) from--;
    while (to < points.length - 3 && curvatureAt(points, to + 1) < 0) to++;
    const middle = best * size + (size >> 1);
    found.push({ apex: middle, from: from * size, to: (to + 1) * size - 1, level, strength: bestStrength });
    best = -1;
    bestStrength = 0;
  };
  // The same sum as curvatureAt, with the five points kept in hand: this is the only loop over all points and levels.
  const scale = -unit / 7;
  let a = points[0]!;
  let b = points[1]!;
  let c = points[2]!;
  let d = points[3]!;
  for (let i = 2; i < points.length - 2; i++) {
    const e = points[i + 2]!;
    const strength = scale * (2 * (a + e) - b - d - 2 * c);
    a = b;
    b = c;
    c = d;
    d = e;
    if (strength > concaveThreshold) {
      inside = true;
      if (strength > bestStrength) {
        bestStrength = strength;
        best = i;
      }
    } else if (inside && strength < -convexThreshold) {
      close();
      inside = false;
    }
  }
  close();
  return found;
}

/** Index of the first candidate whose apex is at or after the point; candidates are in order of apex. */
function lowerBound(list: Candidate[], point: number): number {
  let low = 0;
  let high = list.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (list[middle]!.apex < point) low = middle + 1;
    else high = middle;
  }
  return low;
}

/**
 * Tops of peaks of any width, by the curvature of the trace at each level of its pyramid. Curvature is blind to straight drift
 * and, on the tail of a larger peak, has the sign opposite to a peak's: a small peak on a tail shows up as
 * a concave stretch even where it has no maximum of its own. Going from fine to coarse, a stretch that holds no known
 * apex is new; one that holds exactly one, so far hidden in noise, and stands out more replaces it; one that holds several is their
 * blurred sum and is ignored. In order of time.
 */
export function detectPeakCandidates(levels: Float64Array[], levelDeviation: Float64Array): Candidate[] {
  let accepted: Candidate[] = [];
  levels.forEach((points, level) => {
    const added: Candidate[] = [];
    for (const stretch of concaveStretches(points, level, levelDeviation[level]!)) {
      const first = lowerBound(accepted, stretch.from);
      let inside = 0;
      while (first + inside < accepted.length && accepted[first + inside]!.apex <= stretch.to) inside++;
      if (inside === 0) {
        // Within one point of this level a narrower peak throws its own blurred image.
        const margin = level === 0 ? 0 : 2 ** level;
        const covered =
          (first > 0 && accepted[first - 1]!.to >= stretch.from - margin) ||
          (first < accepted.length && accepted[first]!.from <= stretch.to + margin);
        if (!covered) added.push(stretch);
      } else if (
        inside === 1 &&
        accepted[first]!.strength < clearStrength &&
        stretch.strength > accepted[first]!.strength
      ) {
        const known = accepted[first]!;
        const neighbourBefore = accepted[first - 1];
        const neighbourAfter = accepted[first + 1];
        const overlap = Math.min(stretch.to, known.to) - Math.max(stretch.from, known.from) + 1;
        const contains = 2 * overlap > known.to - known.from + 1;
        const clear =
          (!neighbourBefore || neighbourBefore.to < stretch.from) &&
          (!neighbourAfter || neighbourAfter.from > stretch.to);
        if (contains && clear) accepted[first] = stretch;
      }
    }
    if (added.length > 0) accepted = [...accepted, ...added].sort((a, b) => a.apex - b.apex);
  });
  return accepted;
}
