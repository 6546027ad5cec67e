import { baselineAt, type BaselineNode } from './baseline';
import { inflectionDistance, type Cluster } from './bounds';
import { meanOf, type RunningSum } from './running-sum';
import { findValley } from './valleys';

/**
 * Baseline corners inside clusters: through each valley that would otherwise lie under the baseline (a trace cannot go
 * under its own baseline), or, for valley-to-valley, through every valley. `nodes` in order; returns a new list.
 */
export function anchorValleys(
  nodes: BaselineNode[],
  clusters: Cluster[],
  running: RunningSum,
  deviation: number,
  everyValley: boolean,
): BaselineNode[] {
  const added: BaselineNode[] = [];
  for (const cluster of clusters) {
    for (let k = 1; k < cluster.candidates.length; k++) {
      const a = cluster.candidates[k - 1]!;
      const b = cluster.candidates[k]!;
      const width = Math.max(1, Math.floor(Math.min(inflectionDistance(a), inflectionDistance(b)) / 2)) | 1;
      const valley = findValley(running, a.apex, b.apex, width);
      const isValley = valley.index > a.to && valley.index < b.from;
      // Deeper than the tops beside it are high: that is a dip with its rims, not a baseline drawn too high.
      const lowerTop = Math.min(
        meanOf(running, a.apex - (width >> 1), a.apex + (width >> 1) + 1),
        meanOf(running, b.apex - (width >> 1), b.apex + (width >> 1) + 1),
      );
      const under = valley.level < (-4 * deviation) / Math.sqrt(width) && -valley.level < lowerTop;
      if (isValley && (under || everyValley)) {
        added.push({
          index: valley.index,
          level: valley.level + baselineAt(nodes, valley.index),
          points: width,
        });
      }
    }
  }
  if (added.length === 0) return nodes;
  return [...nodes, ...added].sort((p, q) => p.index - q.index);
}
