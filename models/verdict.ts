import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { idColumn, instantColumn, jsonColumn, optional, textColumn, uuidColumn } from './columns';

/** What the rules said of a fraction at one moment. Never a release. */
export class Verdict extends Model<InferAttributes<Verdict>, InferCreationAttributes<Verdict>> {
  declare id: string;
  declare fractionId: string;
  declare specificationId: CreationOptional<string | null>;
  declare state: 'pass' | 'fail' | 'inconclusive' | 'blind' | 'incomplete';
  declare criteria: unknown;
  declare coverage: unknown;
  declare engineVersion: string;
  declare contentDigest: string;
  declare createdAt: CreationOptional<Date>;
}

export function initVerdict(sequelize: Sequelize): void {
  Verdict.init(
    {
      id: idColumn(),
      fractionId: uuidColumn(),
      specificationId: optional(uuidColumn()),
      state: textColumn(),
      criteria: jsonColumn('criteria'),
      coverage: jsonColumn('coverage'),
      engineVersion: textColumn(),
      contentDigest: textColumn(),
      createdAt: instantColumn(),
    },
    { sequelize, modelName: 'Verdict', tableName: 'verdicts', timestamps: true, updatedAt: false },
  );
}
