import {
  type InferAttributes,
  type InferCreationAttributes,
  DataTypes,
  Model,
  type Sequelize,
} from 'sequelize';
import { integerColumn } from './columns';

/** The next number of a kind of code; locked while a code is given out. */
export class CodeCounter extends Model<InferAttributes<CodeCounter>, InferCreationAttributes<CodeCounter>> {
  declare scope: string;
  declare nextNumber: number;
}

export function initCodeCounter(sequelize: Sequelize): void {
  CodeCounter.init(
    {
      scope: { type: DataTypes.STRING, primaryKey: true },
      nextNumber: integerColumn(),
    },
    { sequelize, modelName: 'CodeCounter', tableName: 'code_counters', timestamps: false },
  );
}
