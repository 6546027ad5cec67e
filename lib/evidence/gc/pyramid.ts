/**
 * The trace at coarser and coarser sampling: level 0 is the signal itself, each next level the means
 * of neighbouring pairs. A peak of any width is a few points wide at one of the levels, so the same
 * short filter finds peaks of 3 and of 30,000 points. All levels together cost one more pass.
 */
export function buildPyramid(signal: Float64Array, minimumPoints = 24): Float64Array[] {
  const levels = [signal];
  let current = signal;
  while (current.length >> 1 >= minimumPoints) {
    const next = new Float64Array(current.length >> 1);
    for (let i = 0, j = 0; i < next.length; i++, j += 2) next[i] = 0.5 * (current[j]! + current[j + 1]!);
    levels.push(next);
    current = next;
  }
  return levels;
}
