import { invalidField } from '@/lib/errors';

/** 422 when the receiver with content weighs less than the empty one. Either may still be missing. */
export function requireMasses(masses: { tareMassG?: number | null; grossMassG?: number | null }): void {
  const { tareMassG: tare, grossMassG: gross } = masses;
  if (tare == null || gross == null || gross >= tare) return;
  throw invalidField(
    'grossMassG',
    `The gross mass (${gross} g) is below the tare (${tare} g): check that the two are not swapped.`,
  );
}
