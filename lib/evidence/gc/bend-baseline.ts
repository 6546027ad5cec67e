import type { BaselineNode } from './baseline';
import type { Cluster } from './bounds';

/** Straight pieces that a bent stretch is drawn with: the sag that is left is under half a percent of the bend. */
const pieces = 16;

/** Second divided difference of three corners: half the second derivative, per point squared. */
function bendOf(a: BaselineNode, b: BaselineNode, c: BaselineNode): number {
  return (
    ((c.level - b.level) / (c.index - b.index) - (b.level - a.level) / (b.index - a.index)) /
    (c.index - a.index)
  );
}

/**
 * Gives the baseline under a cluster the curve of the drift around it (column bleed in a temperature programme). The curve is
 * the smaller of the two that the corners before and after tell, and none when they disagree in sign: so the
 * tail of a solvent on one side never bends the baseline, and a straight drift stays straight. It must also stand out
 * of the noise of the corners.
 */
export function bendUnderPeaks(
  nodes: BaselineNode[],
  clusters: Cluster[],
  deviation: number,
): BaselineNode[] {
  const measured = nodes.filter((node) => node.points > 0);
  const measuredPosition = new Map(measured.map((node, k) => [node, k]));
  const bent: BaselineNode[] = [];
  let next = 0;
  for (let k = 0; k < nodes.length; k++) {
    const a = nodes[k]!;
    const b = nodes[k + 1];
    bent.push(a);
    if (!b || a.points === 0 || b.points === 0) continue;
    while (next < clusters.length && clusters[next]!.to <= a.index) next++;
    const cluster = clusters[next];
    if (!cluster || cluster.from >= b.index) continue;
    const position = measuredPosition.get(a)!;
    const before = measured[position - 1];
    const after = measured[position + 2];
    if (!before || !after) continue;
    const first = bendOf(before, a, b);
    const second = bendOf(a, b, after);
    if (first * second <= 0) continue;
    const bend = Math.abs(first) < Math.abs(second) ? first : second;
    const length = b.index - a.index;
    const doubt = deviation / Math.sqrt(Math.min(before.points, a.points, b.points, after.points));
    if (Math.abs(bend) * length * length < 4 * 4 * doubt) continue;
    for (let p = 1; p < pieces; p++) {
      const share = p / pieces;
      const straight = a.level + share * (b.level - a.level);
      const index = a.index + share * length;
      bent.push({ index, level: straight - bend * share * (1 - share) * length * length, points: 0 });
    }
  }
  return bent;
}

/** Median bend of neighbouring corners in standard deviations of their noise. */
export function bendSignificance(nodes: BaselineNode[], deviation: number): number {
  const measured = nodes.filter((node) => node.points > 0);
  const found: number[] = [];
  for (let k = 1; k + 1 < measured.length; k++) {
    const [a, b, c] = [measured[k - 1]!, measured[k]!, measured[k + 1]!];
    const sag = Math.abs(bendOf(a, b, c)) * (b.index - a.index) * (c.index - b.index);
    found.push((sag * Math.sqrt(Math.min(a.points, b.points, c.points))) / deviation);
  }
  found.sort((p, q) => p - q);
  return found.length === 0 ? 0 : found[found.length >> 1]!;
}
