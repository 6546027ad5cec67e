import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import {
  doubleColumn,
  idColumn,
  instantColumn,
  integerColumn,
  jsonColumn,
  optional,
  textColumn,
  uuidColumn,
} from './columns';

/** One version of the integration of a trace. Never changed; a new one is added. */
export class Integration extends Model<InferAttributes<Integration>, InferCreationAttributes<Integration>> {
  declare id: string;
  declare traceId: string;
  declare number: number;
  declare methodVersion: string;
  declare parameters: Record<string, unknown>;
  declare reason: CreationOptional<string | null>;
  declare authorId: CreationOptional<string | null>;
  declare authorName: string;
  declare noise: number;
  declare baseline: unknown;
  declare flags: string[];
  declare createdAt: CreationOptional<Date>;
}

export function initIntegration(sequelize: Sequelize): void {
  Integration.init(
    {
      id: idColumn(),
      traceId: uuidColumn(),
      number: integerColumn(),
      methodVersion: textColumn(),
      parameters: jsonColumn('parameters'),
      reason: optional(textColumn()),
      authorId: optional(uuidColumn()),
      authorName: textColumn(),
      noise: doubleColumn(),
      baseline: jsonColumn('baseline'),
      flags: jsonColumn('flags'),
      createdAt: instantColumn(),
    },
    { sequelize, modelName: 'Integration', tableName: 'integrations', timestamps: true, updatedAt: false },
  );
}
