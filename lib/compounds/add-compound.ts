import { recorded } from '@/lib/audit/recorded';
import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { newId } from '@/lib/database/ids';
import { Compound } from '@/lib/database/records';
import { checkIdentity } from './check-identity';
import { describeCompound } from './read-compound';
import type { CompoundJson, NewCompound } from './schema';
import { requireUnusedIdentity, writeSynonyms } from './write-synonyms';

/** Adds a compound for all groups. @throws Problem 403 for who is no PI, 409 if it is there, 422 if it contradicts itself. */
export async function addCompound(actor: Actor, typed: NewCompound): Promise<CompoundJson> {
  authorise(actor, 'compound.write', null);
  const identity = await checkIdentity(typed);
  const compound = await recorded(actor, async ({ transaction, record }) => {
    await requireUnusedIdentity({ name: typed.name, casNumber: identity.casNumber }, null, transaction);
    const facts = {
      name: typed.name,
      ...identity,
      inchiKey: typed.inchiKey ?? null,
      peroxideClass: typed.peroxideClass ?? null,
    };
    const made = await Compound.create({ id: newId(), ...facts }, { transaction });
    const synonyms = await writeSynonyms(made, typed.synonyms ?? [], transaction);
    record({
      type: 'compound.created',
      recordType: 'compound',
      recordId: made.id,
      after: { ...facts, synonyms },
    });
    return made;
  });
  return describeCompound(compound);
}
