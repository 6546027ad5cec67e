import { recorded } from '@/lib/audit/recorded';
import { systemActor } from '@/lib/auth/actor';
import { newId } from '@/lib/database/ids';
import { Compound, LiteratureValue, RunImpurity, Specification } from '@/lib/database/records';
import { unique } from '../support/test-server';

type Fields = Record<string, unknown>;

async function write<T>(make: (transaction: import('sequelize').Transaction) => Promise<T>): Promise<T> {
  return recorded(systemActor('Test factory'), async ({ transaction, record }) => {
    record({ type: 'laboratory.seeded', recordType: 'laboratory', recordId: 'test' });
    return make(transaction);
  });
}

/** A literature value; give at least property, value, unit and source. */
export async function addLiterature(compoundId: string, fields: Fields): Promise<LiteratureValue> {
  return write((transaction) =>
    LiteratureValue.create({ id: newId(), compoundId, preferred: true, ...fields } as never, { transaction }),
  );
}

/** A compound with a refractive index at 20 °C and the sodium D line; the name is invented, the value has its source. */
export async function buildIndexedCompound(n: number, source: string, temperatureC = 20): Promise<Compound> {
  const compound = await write((transaction) =>
    Compound.create({ id: newId(), name: unique('liquid') }, { transaction }),
  );
  await addLiterature(compound.id, {
    property: 'refractive index',
    value: n,
    unit: '1',
    temperatureC,
    wavelengthNm: 589.3,
    source,
  });
  return compound;
}

/** Names a compound as a known impurity of a run. */
export async function addImpurity(runId: string, compoundId: string): Promise<void> {
  await write((transaction) => RunImpurity.create({ id: newId(), runId, compoundId }, { transaction }));
}

/** An approved specification of a compound in a group. */
export async function buildSpecification(fields: Fields & { writtenById: string }): Promise<Specification> {
  return write((transaction) =>
    Specification.create(
      {
        id: newId(),
        grade: 'test grade',
        edition: 1,
        decisionRule: 'guarded',
        approvedById: fields.writtenById,
        approvedAt: new Date(),
        ...fields,
      } as never,
      { transaction },
    ),
  );
}
