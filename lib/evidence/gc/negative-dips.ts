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

/** Stretches without a peak, less the dips and a third of their length on either side, so that no dip draws the baseline down. */
export function withoutDips(
  gaps: { from: number; to: number }[],
  dips: Dip[],
): { from: number; to: number }[] {
  let left = gaps;
  for (const dip of dips) {
    const margin = Math.ceil((dip.to - dip.from) / 3);
    const from = dip.from - margin;
    const to = dip.to + margin;
    left = left.flatMap((gap) => {
      if (to <= gap.from || from >= gap.to) return [gap];
      return [
        { from: gap.from, to: from },
        { from: to, to: gap.to },
      ].filter((part) => part.to - part.from >= 3);
    });
  }
  return left;
}
