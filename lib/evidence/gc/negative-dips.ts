import { meanOf, type RunningSum } from './running-sum';

/** Points from..to, to not included, and the lowest. */
export interface Dip {
  from: number;
  to: number;
  lowest: number;
  depth: number;
}

/**
 * Stretches that lie under the baseline by more than noise can explain (valve switching, a gas the detector
 * sees as less than the carrier, a baseline drawn too high). `minimumDepth` is in the unit of the signal.
 */
export function findNegativeDips(
  corrected: Float64Array,
  running: RunningSum,
  windowPoints: number,
  deviation: number,
  minimumDepth: number,
): Dip[] {
  const size = Math.max(1, windowPoints);
  const doubt = deviation / Math.sqrt(size);
  const limit = -Math.max(5 * doubt, minimumDepth);
  const dips: Dip[] = [];
  for (let i = 0; i + size <= corrected.length; i += size) {
    if (!(meanOf(running, i, i + size) < limit)) continue;
    let from = i;
    let to = i + size;
    while (from > 0 && meanOf(running, from - size, from) < -2 * doubt) from -= size;
    while (to < corrected.length && meanOf(running, to, to + size) < -2 * doubt) to += size;
    from = Math.max(0, from);
    to = Math.min(corrected.length, to);
    let lowest = from;
    for (let k = from; k < to; k++) if (corrected[k]! < corrected[lowest]!) lowest = k;
    dips.push({ from, to, lowest, depth: -corrected[lowest]! });
    i = to - size;
  }
  return dips;
}

/** Whether the trace itself bends down in a dip; under a baseline drawn too high it runs on nearly straight. */
function isBentDown(signal: RunningSum, dip: Dip): boolean {
  const size = Math.max(1, Math.round((dip.to - dip.from) / 8));
  const left = meanOf(signal, dip.from - size, dip.from);
  const right = meanOf(signal, dip.to, dip.to + size);
  const share = (dip.lowest - dip.from) / (dip.to - dip.from);
  const bottom = meanOf(signal, dip.lowest - (size >> 1), dip.lowest + (size >> 1) + 1);
  return left + share * (right - left) - bottom >= 0.6 * dip.depth;
}

/**
 * Stretches without a peak, less the dips and a third of their length on either side, so that no dip draws the
 * baseline down. `signal` is the running sum of the trace before any baseline; dips longer than `longestPoints` are
 * left to the baseline.
 */
export function withoutDips(
  gaps: { from: number; to: number }[],
  dips: Dip[],
  signal: RunningSum,
  longestPoints: number,
): { from: number; to: number }[] {
  let left = gaps;
  for (const dip of dips) {
    if (dip.to - dip.from > longestPoints || !isBentDown(signal, dip)) continue;
    const margin = Math.ceil((dip.to - dip.from) / 3);
    const from = dip.from - margin;
    const to = dip.to + margin;
    left = left.flatMap((gap) => {
      if (to <= gap.from || from >= gap.to) return [gap];
      return [
        { from: gap.from, to: from },
        { from: to, to: gap.to },
      ].filter((rest) => rest.to - rest.from >= 3);
    });
  }
  return left;
}
