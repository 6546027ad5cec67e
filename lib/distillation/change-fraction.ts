import { fractionChanged } from '@/lib/acceptance/fraction-changed';
import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { invalidField, Problem } from '@/lib/errors';
import { requireSameVersion } from '@/lib/http/version';
import { changedFields } from './changed-fields';
import { requireMasses } from './fraction-masses';
import type { FractionChange } from './fraction-schema';
import { whyNotInState } from './fraction-states';
import { requireFractionForChange } from './require-fraction';
import { requirePlausibleTime } from './run-times';

const words: Record<string, string> = {
  cut: 'cut',
  headTemperatureFromC: 'head temperature at the start',
  headTemperatureToC: 'head temperature at the end',
  pressureMbar: 'pressure',
  tareMassG: 'tare',
  grossMassG: 'gross mass',
  appearance: 'appearance',
  storagePlace: 'storage place',
  collectedAt: 'time of collection',
};

/**
 * Changes the facts of a fraction. 404, 403, 409 for another version, 422; a signed-off fraction needs a
 * reason, since its signature ends with the change.
 */
export async function changeFraction(
  actor: Actor,
  code: string,
  body: FractionChange,
  version: number,
): Promise<void> {
  await recorded(actor, async (recorder) => {
    const { transaction, record } = recorder;
    const fraction = await requireFractionForChange(actor, code, transaction);
    authorise(actor, 'fraction.write', fraction.groupId);
    requireSameVersion(fraction, version);
    const whyNot = whyNotInState('change', fraction.status);
    if (whyNot) throw new Problem('state-conflict', whyNot);
    const { reason, collectedAt, ...rest } = body;
    const wanted = { ...rest, collectedAt: collectedAt === undefined ? undefined : new Date(collectedAt) };
    if (wanted.collectedAt) requirePlausibleTime('collectedAt', wanted.collectedAt);
    const { before, after } = changedFields(fraction.get(), wanted);
    if (Object.keys(after).length === 0) return;
    if (fraction.status === 'signed off' && !reason) {
      throw invalidField(
        'reason',
        'This fraction is signed off, and a change ends its signature. Say why it must change.',
      );
    }
    requireMasses({ tareMassG: fraction.tareMassG, grossMassG: fraction.grossMassG, ...after });
    await fraction.update(after, { transaction });
    record({
      type: 'fraction.changed',
      recordType: 'fraction',
      recordId: fraction.id,
      groupId: fraction.groupId,
      before,
      after,
      reason: reason ?? null,
    });
    const what = `${Object.keys(after)
      .map((name) => words[name] ?? name)
      .join(', ')} changed`;
    // The database computes the net mass.
    await fraction.reload({ transaction });
    await fractionChanged(recorder, fraction, reason ? `${what}: ${reason}` : what);
  });
}
