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
