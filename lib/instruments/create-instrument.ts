import type { z } from 'zod';
import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { newId } from '@/lib/database/ids';
import { Group, Instrument } from '@/lib/database/records';
import { invalidField } from '@/lib/errors';
import type { createInstrumentBody } from './schema';

/** Adds an instrument to a group. */
export async function createInstrument(
  actor: Actor,
  input: z.output<typeof createInstrumentBody>,
): Promise<Instrument> {
  authorise(actor, 'administration.write', null);
  return recorded(actor, async ({ transaction, record }) => {
    const { group, ...facts } = input;
    if (!(await Group.findByPk(group, { transaction })))
      throw invalidField('group', 'There is no such group. Choose one from the list.');
    const instrument = await Instrument.create({ id: newId(), groupId: group, ...facts }, { transaction });
    record({
      type: 'instrument.created',
      recordType: 'instrument',
      recordId: instrument.id,
      groupId: group,
      after: facts,
    });
    return instrument;
  });
}
