import { meanOf, type RunningSum } from './running-sum';

/** A corner of the baseline at a (fractional) point index. */
export interface BaselineNode {
  index: number;
  level: number;
  /** Points behind the level; 0 for corners that were computed from others. */
  points: number;
}

const blocksInWindow = 9;

function median(values: number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[sorted.length >> 1]!;
}

/**
 * Level of a stretch without a peak, at its middle: the mean of its blocks, leaving out blocks that stray from the
 * straight line through the others (a spike, a negative dip, a peak too small to be found).
 * A straight drift inside the stretch is followed exactly.
 */
function robustLevel(
  running: RunningSum,
  from: number,
  to: number,
  deviation: number,
): BaselineNode & { slope: number } {
  const middle = (from + to - 1) / 2;
  const length = to - from;
  if (length < 3 * blocksInWindow)
    return { index: middle, level: meanOf(running, from, to), points: length, slope: 0 };
  const size = Math.floor(length / blocksInWindow);
  const start = from + ((length - size * blocksInWindow) >> 1);
  const means: number[] = [];
  for (let k = 0; k < blocksInWindow; k++)
    means.push(meanOf(running, start + k * size, start + (k + 1) * size));
  const slope = median([0, 1, 2, 3, 4].map((k) => (means[k + 4]! - means[k]!) / 4));
  const flat = means.map((value, k) => value - slope * (k - 4));
  const centre = median(flat);
  const blockDeviation = Math.max(
    1.5 * median(flat.map((value) => Math.abs(value - centre))),
    deviation / Math.sqrt(size),
  );
  const kept = flat.filter((value) => Math.abs(value - centre) <= 4 * blockDeviation);
  const level = kept.reduce((sum, value) => sum + value, 0) / kept.length;
  // The blocks' middle can lie up to half a point beside the stretch's.
  const blockMiddle = start + (size * blocksInWindow - 1) / 2;
  return {
    index: middle,
    level: level + (slope / size) * (middle - blockMiddle),
    points: length,
    slope: slope / size,
  };
}

/**
 * Corners of the baseline: in each stretch without a peak one for every `windowPoints` points. Between them
 * straight lines, so under a cluster of peaks the baseline is the line from the level before it to the level
 * after it; in the first and the last stretch it goes on to the end of the trace with that stretch's own slope.
 * Exact for a constant and for a straight drift.
 */
export function baselineNodes(
  running: RunningSum,
  gaps: { from: number; to: number }[],
  windowPoints: number,
  deviation: number,
): BaselineNode[] {
  const pointCount = running.sums.length - 1;
  const nodes: BaselineNode[] = [];
  for (const gap of gaps) {
    const length = gap.to - gap.from;
    if (length < 1) continue;
    const count = Math.max(1, Math.floor(length / windowPoints));
    for (let k = 0; k < count; k++) {
      const from = gap.from + Math.floor((k * length) / count);
      const to = gap.from + Math.floor(((k + 1) * length) / count);
      const node = robustLevel(running, from, to, deviation);
      const atEdge = (index: number) => ({
        index,
        level: node.level + node.slope * (index - node.index),
        points: 0,
      });
      if (from === 0) nodes.push(atEdge(0));
      nodes.push({ index: node.index, level: node.level, points: node.points });
      if (to === pointCount) nodes.push(atEdge(to - 1));
    }
  }
  return nodes;
}

/** Baseline through the lowest stretch of each half of the trace, for a trace that is nothing but peaks. */
export function lowestNodes(running: RunningSum, pointCount: number, windowPoints: number): BaselineNode[] {
  const size = Math.max(1, Math.min(windowPoints, pointCount >> 3));
  const lowest = (from: number, to: number): BaselineNode => {
    let best: BaselineNode = { index: (from + to) / 2, level: Infinity, points: size };
    for (let i = from; i + size <= to; i += Math.max(1, size >> 1)) {
      const level = meanOf(running, i, i + size);
      if (level < best.level) best = { index: i + (size - 1) / 2, level, points: size };
    }
    return best;
  };
  return [lowest(0, pointCount >> 1), lowest(pointCount >> 1, pointCount)].filter(
    (node) => node.level < Infinity,
  );
}

/** Signal minus baseline, and its running sum. The arrays are filled anew on each call of `subtractBaseline`. */
export interface CorrectedTrace {
  corrected: Float64Array;
  running: RunningSum;
}

export function reserveCorrectedTrace(pointCount: number): CorrectedTrace {
  return {
    corrected: new Float64Array(pointCount),
    running: { sums: new Float64Array(pointCount + 1), offset: 0 },
  };
}

/** Fills `target` with the signal minus the baseline through the nodes (none: the signal itself), in one pass. */
export function subtractBaseline(signal: Float64Array, nodes: BaselineNode[], target: CorrectedTrace): void {
  const { corrected } = target;
  const { sums } = target.running;
  let i = 0;
  let sum = 0;
  // Straight piece from point i up to `end` (not included): level at `origin`, slope per point.
  const piece = (end: number, origin: number, level: number, slope: number) => {
    const stop = Math.min(signal.length, end);
    for (; i < stop; i++) {
      const value = signal[i]! - (level + slope * (i - origin));
      corrected[i] = value;
      sum += value;
      sums[i + 1] = sum;
    }
  };
  const first = nodes[0];
  if (!first) return piece(signal.length, 0, 0, 0);
  piece(Math.floor(first.index) + 1, 0, first.level, 0);
  for (let k = 0; k + 1 < nodes.length; k++) {
    const a = nodes[k]!;
    const b = nodes[k + 1]!;
    piece(Math.floor(b.index) + 1, a.index, a.level, (b.level - a.level) / (b.index - a.index));
  }
  piece(signal.length, 0, nodes[nodes.length - 1]!.level, 0);
}

/** Level of the baseline at a (fractional) point. */
export function baselineAt(nodes: BaselineNode[], index: number): number {
  if (nodes.length === 0) return 0;
  let low = 0;
  let high = nodes.length - 1;
  if (index <= nodes[low]!.index) return nodes[low]!.level;
  if (index >= nodes[high]!.index) return nodes[high]!.level;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (nodes[middle]!.index <= index) low = middle;
    else high = middle;
  }
  const a = nodes[low]!;
  const b = nodes[high]!;
  return a.level + ((b.level - a.level) * (index - a.index)) / (b.index - a.index);
}
