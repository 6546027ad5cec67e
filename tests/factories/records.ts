import { hashPassword } from '@/lib/accounts/password';
import { recorded } from '@/lib/audit/recorded';
import { type Role, type Scope, systemActor } from '@/lib/auth/actor';
import { newId } from '@/lib/database/ids';
import {
  AccessToken,
  Compound,
  Fraction,
  Group,
  Instrument,
  LiteratureValue,
  Membership,
  Run,
  User,
} from '@/lib/database/records';
import { hashToken } from '@/lib/instruments/find-token-actor';
import { unique } from '../support/test-server';

/** Records for tests: each builder makes the parents that are missing. All names are invented. */
const password = 'orchid-condenser-17';
let passwordHash: string | undefined;

type Fields = Record<string, unknown>;

async function write<T>(make: (transaction: import('sequelize').Transaction) => Promise<T>): Promise<T> {
  return recorded(systemActor('Test factory'), async ({ transaction, record }) => {
    record({ type: 'laboratory.seeded', recordType: 'laboratory', recordId: 'test' });
    return make(transaction);
  });
}

export async function buildGroup(fields: Fields = {}): Promise<Group> {
  return write((transaction) =>
    Group.create({ id: newId(), name: unique('Group'), ...fields }, { transaction }),
  );
}

export type BuiltUser = User & { plainPassword: string };

/** A person with roles in one group: `buildUser({ group, roles: ['chemist'] })`. */
export async function buildUser({
  group,
  roles = [],
  ...fields
}: Fields & { group?: Group; roles?: Role[] } = {}): Promise<BuiltUser> {
  passwordHash ??= await hashPassword(password);
  const hash = passwordHash;
  const user = await write(async (transaction) => {
    const made = await User.create(
      {
        id: newId(),
        email: `${unique('person')}@heartcut.example`,
        name: unique('Person'),
        passwordHash: hash,
        ...fields,
      },
      { transaction },
    );
    for (const role of roles) {
      await Membership.create({ id: newId(), userId: made.id, groupId: group!.id, role }, { transaction });
    }
    return made;
  });
  return Object.assign(user, { plainPassword: password });
}

export async function buildCompound(fields: Fields = {}): Promise<Compound> {
  return write((transaction) =>
    Compound.create({ id: newId(), name: unique('compound'), ...fields }, { transaction }),
  );
}

/** Ethyl acetate with the values that judging needs (CRC Handbook; Antoine set after Poling et al.). */
export async function buildEthylAcetate(): Promise<Compound> {
  return write(async (transaction) => {
    const found = await Compound.findOne({ where: { casNumber: '141-78-6' }, transaction });
    if (found) return found;
    const compound = await Compound.create(
      {
        id: newId(),
        name: 'ethyl acetate',
        casNumber: '141-78-6',
        formula: 'C4H8O2',
        molarMassGMol: 88.106,
        smiles: 'CCOC(C)=O',
      },
      { transaction },
    );
    const values = [
      { property: 'refractive index', value: 1.3723, unit: '1', temperatureC: 20, wavelengthNm: 589.3 },
      { property: 'normal boiling point', value: 77.11, unit: '°C', pressureKPa: 101.325 },
    ];
    for (const value of values) {
      await LiteratureValue.create(
        {
          id: newId(),
          compoundId: compound.id,
          source: 'CRC Handbook of Chemistry and Physics',
          preferred: true,
          ...value,
        },
        { transaction },
      );
    }
    return compound;
  });
}

export async function buildRun({
  group,
  chemist,
  target,
  ...fields
}: Fields & { group?: Group; chemist?: User; target?: Compound } = {}): Promise<Run> {
  const owner = group ?? (await buildGroup());
  const person = chemist ?? (await buildUser({ group: owner, roles: ['chemist'] }));
  const compound = target ?? (await buildCompound());
  return write((transaction) =>
    Run.create(
      {
        id: newId(),
        code: unique('D').slice(0, 20),
        groupId: owner.id,
        chemistId: person.id,
        targetCompoundId: compound.id,
        technique: 'fractional',
        chargeMassG: 250,
        chargeSource: 'recovered from reaction 12 (invented)',
        safetyChecks: {},
        startedAt: new Date(),
        ...fields,
      },
      { transaction },
    ),
  );
}

export async function buildFraction({ run, ...fields }: Fields & { run?: Run } = {}): Promise<Fraction> {
  const parent = run ?? (await buildRun());
  return write(async (transaction) => {
    await parent.reload({ transaction, lock: true });
    const number = parent.nextFractionNumber;
    await parent.update({ nextFractionNumber: number + 1 }, { transaction });
    const fraction = await Fraction.create(
      {
        id: newId(),
        code: `${parent.code}-F${number}`,
        runId: parent.id,
        groupId: parent.groupId,
        compoundId: parent.targetCompoundId,
        number,
        cut: 'heart',
        collectedById: parent.chemistId,
        collectedAt: new Date(),
        tareMassG: 50,
        grossMassG: 92.5,
        ...fields,
      },
      { transaction },
    );
    return fraction.reload({ transaction });
  });
}

/** An instrument with a token. The plain token is in `token`; only its hash is in the database. */
export async function buildToken({
  group,
  scopes = ['evidence:write', 'readings:write'],
  ...fields
}: Fields & { group?: Group; scopes?: Scope[] } = {}) {
  const owner = group ?? (await buildGroup());
  const maker = await buildUser();
  const token = unique('test-token');
  const made = await write(async (transaction) => {
    const instrument = await Instrument.create(
      { id: newId(), groupId: owner.id, name: unique('GC'), kind: 'gas chromatograph' },
      { transaction },
    );
    const row = await AccessToken.create(
      {
        id: newId(),
        instrumentId: instrument.id,
        name: 'instrument PC',
        tokenHash: hashToken(token),
        hint: token.slice(-4),
        scopes,
        expiresAt: new Date(Date.now() + 86_400_000),
        madeById: maker.id,
        ...fields,
      },
      { transaction },
    );
    return { instrument, row };
  });
  return { token, group: owner, ...made };
}
