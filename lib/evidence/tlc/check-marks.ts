import type { EvidenceFile } from '@/lib/database/records';
import { Problem } from '@/lib/errors';
import { type Measured, measureMarks } from './measure-marks';
import type { PlateBody } from './schema';
import { VISUALISERS } from './visualisers';

function extentOf(body: PlateBody, photo: EvidenceFile) {
  if (body.units === 'px')
    return photo.widthPx && photo.heightPx ? { width: photo.widthPx, height: photo.heightPx } : undefined;
  return body.widthMm && body.heightMm ? { width: body.widthMm, height: body.heightMm } : undefined;
}

export type CheckedMarks = { lanes: Measured['lanes']; flags: string[] };

/** Rf of every spot, or 422 that names each mark that is wrong. */
export function checkMarks(body: PlateBody, photo: EvidenceFile): CheckedMarks {
  const measured = measureMarks({ ...body, extent: extentOf(body, photo) });
  const [first] = measured.problems;
  if (first) throw new Problem('invalid', first.message, { errors: measured.problems });
  const isKnown = VISUALISERS.some((one) => one.id === body.visualiser);
  return {
    lanes: measured.lanes,
    flags: isKnown ? measured.flags : [...measured.flags, 'visualiser not known'],
  };
}
