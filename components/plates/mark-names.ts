import type { Measured } from '@/lib/evidence/tlc/measure-marks';
import { markAt, type MarkRef, type Marks } from './marks';
import { confidenceWords } from './proposals';

/** "0.44 ± 0.01 (k = 1)": two decimals, the standard uncertainty, its coverage factor named. */
export function rfText(rf: number, rfUncertainty: number): string {
  return `${rf.toFixed(2)} ± ${Math.max(0.01, rfUncertainty).toFixed(2)} (k = 1)`;
}

const cornerNames = ['Top left', 'Top right', 'Bottom right', 'Bottom left'];

/** What a mark is called in lists and tables, without what was measured. */
export function plainName(marks: Marks, ref: MarkRef): string {
  switch (ref.kind) {
    case 'corner':
      return marks.corners.length === 4 ? `${cornerNames[ref.index]} corner` : `Corner ${ref.index + 1}`;
    case 'baseline':
      return `Baseline, point ${ref.index + 1}`;
    case 'front':
      return `Solvent front, point ${ref.index + 1}`;
    case 'lane':
      return `Lane ${marks.lanes[ref.lane]?.label ?? ''}`;
    case 'spot':
      return `Lane ${marks.lanes[ref.lane]?.label ?? ''}, spot ${ref.spot + 1}`;
  }
}

/** "proposed (sure, 91 %)"; null for a mark of the person's own. */
export function proposedWords(marks: Marks, ref: MarkRef): string | null {
  const confidence = markAt(marks, ref)?.proposed;
  return confidence === undefined ? null : `proposed (${confidenceWords(confidence)})`;
}

/** What a mark is called, for screen readers: its name, its Rf, and whether it is only proposed. */
export function nameOf(marks: Marks, ref: MarkRef, measured: Measured | null): string {
  const result = ref.kind === 'spot' ? measured?.lanes[ref.lane]?.spots[ref.spot] : null;
  const proposed = proposedWords(marks, ref);
  return [
    plainName(marks, ref),
    ...(result ? [`Rf ${rfText(result.rf, result.rfUncertainty)}`] : []),
    ...(proposed ? [proposed, 'Enter accepts it'] : []),
  ].join(', ');
}
