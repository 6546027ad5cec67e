import { baselineAt, type BaselineNode } from './baseline';
import type { Cluster } from './bounds';
import { meanOf, type RunningSum } from './running-sum';

/** A peak whose flank at the trace's end is under this share of its height has come down to the baseline there. */
const downToBaseline = 0.03;

/**
 * A cluster that reaches the first or the last point has no stretch without a peak on that side. Where its flank has
 * practically come down, the trace's own end is taken for the baseline; where it has not, the baseline stays level
 * (and the peak is flagged as cut).
 */
export function anchorEnds(
  nodes: BaselineNode[],
  clusters: Cluster[],
  signal: Float64Array,
  running: RunningSum,
  half: number,
): BaselineNode[] {
  const anchored = [...nodes];
  const points = Math.max(1, Math.round(half / 2));
  const height = (cluster: Cluster) =>
    Math.max(...cluster.candidates.map(({ apex }) => signal[apex]! - baselineAt(nodes, apex)));
  const first = clusters[0];
  if (first && first.from === 0) {
    const level = meanOf(running, 0, points);
    if (Math.abs(level - nodes[0]!.level) < downToBaseline * height(first)) {
      anchored.unshift({ index: 0, level, points });
    }
  }
  const last = clusters[clusters.length - 1];
  if (last && last.to >= signal.length) {
    const level = meanOf(running, signal.length - points, signal.length);
    if (Math.abs(level - nodes[nodes.length - 1]!.level) < downToBaseline * height(last)) {
      anchored.push({ index: signal.length - 1, level, points });
    }
  }
  return anchored;
}
