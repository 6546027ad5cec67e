import { type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';
import { idColumn, uuidColumn } from './columns';

/** A compound that is known or expected to be in the charge besides the target. */
export class RunImpurity extends Model<InferAttributes<RunImpurity>, InferCreationAttributes<RunImpurity>> {
  declare id: string;
  declare runId: string;
  declare compoundId: string;
}

export function initRunImpurity(sequelize: Sequelize): void {
  RunImpurity.init(
    {
      id: idColumn(),
      runId: uuidColumn(),
      compoundId: uuidColumn(),
    },
    { sequelize, modelName: 'RunImpurity', tableName: 'run_impurities', timestamps: false },
  );
}
