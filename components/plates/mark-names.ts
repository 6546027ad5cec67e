import type { Measured } from '@/lib/evidence/tlc/measure-marks';
import type { MarkRef, Marks } from './marks';

/** "0.44 ± 0.01": two decimals, the uncertainty as given (k = 1). */
export function rfText(rf: number, rfUncertainty: number): string {
  return `${rf.toFixed(2)} ± ${Math.max(0.01, rfUncertainty).toFixed(2)}`;
}

/** What a mark is called, for screen readers and tables. */
export function nameOf(marks: Marks, ref: MarkRef, measured: Measured | null): string {
  if (ref.kind === 'baseline') return `Baseline, point ${ref.index + 1}`;
  if (ref.kind === 'front') return `Solvent front, point ${ref.index + 1}`;
  const lane = marks.lanes[ref.lane];
  if (ref.kind === 'lane') return `Lane ${lane?.label ?? ''}`;
  const result = measured?.lanes[ref.lane]?.spots[ref.spot];
  const rf = result ? `, Rf ${rfText(result.rf, result.rfUncertainty)}` : '';
  return `Lane ${lane?.label ?? ''}, spot ${ref.spot + 1}${rf}`;
}
