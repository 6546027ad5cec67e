import type { Marks, PointKind } from './marks';

/** What a press on the photo sets. */
export const markModes = ['move', 'corner', 'baseline', 'front', 'lane', 'spot'] as const;
export type MarkMode = (typeof markModes)[number];

export const modeWords: Record<MarkMode, string> = {
  move: 'Move',
  corner: 'Corners',
  baseline: 'Baseline',
  front: 'Front',
  lane: 'Lane',
  spot: 'Spot',
};

export const isPointMode = (mode: MarkMode): mode is PointKind =>
  mode === 'corner' || mode === 'baseline' || mode === 'front';

/** What to do in a mode, in one sentence. */
export function adviceFor(mode: MarkMode, marks: Marks): string {
  switch (mode) {
    case 'move':
      return 'Press on a mark, then on its new place; or drag it; or choose it with Tab and use the arrow keys (with Shift 10 px).';
    case 'corner':
      return marks.corners.length < 4
        ? 'Press on the four corners of the plate, in any order. They take the tilt of the photo out of Rf.'
        : 'The plate has its four corners. Drag them until the outline lies on the edges.';
    case 'baseline':
      return marks.baseline.length < 2
        ? 'Press on the baseline at two places, far apart: left and right of the lanes.'
        : 'The baseline has its points. Drag them, or remove one to set it anew.';
    case 'front':
      return marks.front.length < 2
        ? 'Press on the solvent front at two places; up to five for a curved one.'
        : 'Add points if the front is curved (five at most), or go on to the lanes.';
    case 'lane':
      return 'Press on each lane, anywhere along it, then say below what was spotted there.';
    case 'spot':
      return 'Press on the centre of each spot. It goes to the nearest lane.';
  }
}

/** The step that comes next for marks that are not complete. */
export function nextMode(marks: Marks): MarkMode {
  if (marks.baseline.length === 0 && marks.corners.length < 4) return 'corner';
  if (marks.baseline.length < 2) return 'baseline';
  if (marks.front.length < 2) return 'front';
  if (marks.lanes.length === 0) return 'lane';
  return 'spot';
}
