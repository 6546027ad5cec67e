import type { Transaction } from 'sequelize';
import { isId } from '@/lib/database/ids';
import { Compound, type Fraction, Fraction as Fractions, type Run } from '@/lib/database/records';
import { type FieldError, Problem } from '@/lib/errors';
import type { PlateBody } from './schema';

export type ResolvedSubject = {
  subjectKind: PlateBody['lanes'][number]['subject']['kind'];
  fractionId: string | null;
  compoundId: string | null;
};

function asked(lanes: PlateBody['lanes'], key: 'code' | 'compound'): { path: string; text: string }[] {
  return lanes.flatMap(({ subject }, index) => {
    const text = (subject as { code?: string; compound?: string })[key];
    return text ? [{ path: `lanes.${index}.subject.${key}`, text }] : [];
  });
}

/** The fractions of a run that lanes name, locked in the order of their codes so that two plates never wait crosswise. */
async function lockFractions(
  run: Run,
  codes: string[],
  ids: string[],
  transaction: Transaction,
): Promise<Fraction[]> {
  const rows = await Fractions.findAll({ where: { runId: run.id }, attributes: ['id', 'code'], transaction });
  const wanted = rows.filter((row) => codes.includes(row.code) || ids.includes(row.id));
  const locked: Fraction[] = [];
  for (const { id } of wanted.sort((a, b) => (a.code < b.code ? -1 : 1))) {
    const row = await Fractions.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE });
    if (row) locked.push(row);
  }
  return locked;
}

async function findCompound(text: string, transaction: Transaction): Promise<Compound | null> {
  return Compound.findOne({ where: isId(text) ? { id: text } : { casNumber: text }, transaction });
}

/**
 * Turns what the lanes name into records: fractions must be of this run, compounds must be known. `alsoLock` are
 * fractions that the plate named before. Returns the locked fractions too. 422 with each lane that is wrong.
 */
export async function resolveSubjects(
  run: Run,
  lanes: PlateBody['lanes'],
  transaction: Transaction,
  alsoLock: string[] = [],
): Promise<{ subjects: ResolvedSubject[]; fractions: Fraction[] }> {
  const codes = asked(lanes, 'code');
  const fractions = await lockFractions(
    run,
    codes.map((one) => one.text),
    alsoLock,
    transaction,
  );
  const byCode = new Map(fractions.map((fraction) => [fraction.code, fraction.id]));
  const errors: FieldError[] = codes
    .filter((one) => !byCode.has(one.text))
    .map(({ path, text }) => ({ path, message: `${text} is not a fraction of the run ${run.code}.` }));
  const compounds = new Map<string, string>();
  for (const { path, text } of asked(lanes, 'compound')) {
    const compound = await findCompound(text, transaction);
    if (compound) compounds.set(text, compound.id);
    else errors.push({ path, message: `There is no compound ${text}. Add it under Compounds first.` });
  }
  if (errors.length > 0) throw new Problem('invalid', errors[0]!.message, { errors });
  const subjects = lanes.map(({ subject }): ResolvedSubject => {
    const { code, compound } = subject as { code?: string; compound?: string };
    return {
      subjectKind: subject.kind,
      fractionId: code ? byCode.get(code)! : null,
      compoundId: compound ? compounds.get(compound)! : null,
    };
  });
  return { subjects, fractions };
}
