import type { Point } from './polyline';

/** What became of the proposed marks in the hands of a person. */
export type ProposalDiff = { accepted: number; moved: number; added: number; removed: number };

type Marks = {
  corners?: readonly Point[] | null;
  baseline: readonly Point[];
  front: readonly Point[];
  lanes: readonly { x?: number | null; spots: readonly Point[] }[];
};

/** Marks this near to the proposal are taken as they were proposed, px: less is no move of a hand. */
const SAME_PLACE_PX = 0.5;
/** A mark further away than this share of the marks' extent is another mark, not the proposed one moved. */
const FARTHEST_MOVE_SHARE = 0.1;

function reachOf(marks: Marks): number {
  const all = [...(marks.corners ?? []), ...marks.baseline, ...marks.front];
  if (all.length === 0) return Infinity;
  const extent = (key: 'x' | 'y') =>
    Math.max(...all.map((point) => point[key])) - Math.min(...all.map((point) => point[key]));
  return FARTHEST_MOVE_SHARE * Math.hypot(extent('x'), extent('y'));
}

/** Pairs proposed with final marks of one sort, the nearest first; each mark counts once. */
function diffPoints(proposed: readonly Point[], final: readonly Point[], reach: number): ProposalDiff {
  const pairs = proposed
    .flatMap((one, p) =>
      final.map((other, f) => ({ p, f, apart: Math.hypot(one.x - other.x, one.y - other.y) })),
    )
    .filter(({ apart }) => apart <= reach)
    .sort((a, b) => a.apart - b.apart || a.p - b.p || a.f - b.f);
  const [usedP, usedF] = [new Set<number>(), new Set<number>()];
  let [accepted, moved] = [0, 0];
  for (const { p, f, apart } of pairs) {
    if (usedP.has(p) || usedF.has(f)) continue;
    usedP.add(p);
    usedF.add(f);
    if (apart <= SAME_PLACE_PX) accepted += 1;
    else moved += 1;
  }
  return { accepted, moved, added: final.length - usedF.size, removed: proposed.length - usedP.size };
}

/**
 * How many of the proposed marks (corners, points of the lines, lanes, spots) a person accepted as they were, moved,
 * removed, and how many were added. Both in pixels of the same photo. Pure.
 */
export function diffProposal(proposal: Marks, marks: Marks): ProposalDiff {
  const reach = reachOf(proposal.corners?.length ? proposal : marks);
  const lanesOf = ({ lanes }: Marks): Point[] =>
    lanes.flatMap(({ x }) => (typeof x === 'number' ? [{ x, y: 0 }] : []));
  const spotsOf = ({ lanes }: Marks): Point[] => lanes.flatMap(({ spots }) => [...spots]);
  const parts = [
    diffPoints(proposal.corners ?? [], marks.corners ?? [], reach),
    diffPoints(proposal.baseline, marks.baseline, reach),
    diffPoints(proposal.front, marks.front, reach),
    diffPoints(lanesOf(proposal), lanesOf(marks), reach),
    diffPoints(spotsOf(proposal), spotsOf(marks), reach),
  ];
  const sum = (key: keyof ProposalDiff) => parts.reduce((total, part) => total + part[key], 0);
  return { accepted: sum('accepted'), moved: sum('moved'), added: sum('added'), removed: sum('removed') };
}
