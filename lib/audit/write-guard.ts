import type { Model, ModelStatic, Sequelize, Transaction } from 'sequelize';

/** What a recorded transaction remembers: the kinds of record it wrote. */
export type WriteLog = { written: Set<string> };

// A symbol on the transaction survives that bundlers evaluate this module more than once.
const writeLogKey = Symbol.for('heartcut.writeLog');

/** Rows of housekeeping, not of evidence: throttles, mail that waits, counters, one-time links. */
const housekeeping = new Set(['SignInThrottle', 'PasswordReset', 'CodeCounter', 'OutboxMessage']);

export function attachWriteLog(transaction: Transaction): WriteLog {
  const log: WriteLog = { written: new Set() };
  (transaction as unknown as Record<symbol, WriteLog>)[writeLogKey] = log;
  return log;
}

function noteWrite(modelName: string, transaction: Transaction | null | undefined): void {
  if (housekeeping.has(modelName)) return;
  const log = transaction && (transaction as unknown as Record<symbol, WriteLog | undefined>)[writeLogKey];
  if (!log)
    throw new Error(`${modelName} may only be written inside recorded(): every change leaves an audit event`);
  log.written.add(modelName);
}

type BulkOptions = { model?: ModelStatic<Model>; transaction?: Transaction | null };

/** Refuses every write by a model outside `recorded()`. Audit is not a thing one can forget. */
export function guardWrites(sequelize: Sequelize): void {
  const one = (instance: Model, options: { transaction?: Transaction | null }) =>
    noteWrite((instance.constructor as ModelStatic<Model>).name, options.transaction);
  const modelNameOf = (options: BulkOptions) => options.model?.name ?? 'record';
  sequelize.addHook('beforeSave', one as never);
  sequelize.addHook('beforeDestroy', one as never);
  sequelize.addHook('beforeBulkCreate', ((instances: Model[], options: BulkOptions) => {
    for (const instance of instances) one(instance, options);
  }) as never);
  sequelize.addHook('beforeBulkUpdate', ((options: BulkOptions) =>
    noteWrite(modelNameOf(options), options.transaction)) as never);
  sequelize.addHook('beforeBulkDestroy', ((options: BulkOptions) =>
    noteWrite(modelNameOf(options), options.transaction)) as never);
}
