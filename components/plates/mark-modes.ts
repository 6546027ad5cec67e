import type { Marks } from './marks';

/** What a press on the photo sets. */
export const markModes = ['move', 'baseline', 'front', 'lane', 'spot'] as const;
export type MarkMode = (typeof markModes)[number];

export const modeWords: Record<MarkMode, string> = {
  move: 'Move',
  baseline: 'Baseline',
  front: 'Front',
  lane: 'Lane',
  spot: 'Spot',
};

/** What to do in a mode, in one sentence. */
export function adviceFor(mode: MarkMode, marks: Marks): string {
  switch (mode) {
    case 'move':
      return 'Drag a mark, or choose it with Tab and move it with the arrow keys (with Shift 10 px). Delete takes it away.';
    case 'baseline':
      return marks.baseline.length < 2
        ? 'Press on the baseline at two places, far apart: left and right of the lanes.'
        : 'The baseline has its two points. Drag them, or remove one to set it anew.';
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
  if (marks.baseline.length < 2) return 'baseline';
  if (marks.front.length < 2) return 'front';
  if (marks.lanes.length === 0) return 'lane';
  return 'spot';
}
