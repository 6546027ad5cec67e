import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import {
  idColumn,
  instantColumn,
  integerColumn,
  jsonColumn,
  optional,
  textColumn,
  uuidColumn,
} from './columns';

/** One edition of the limits for a compound and grade in a group. */
export class Specification extends Model<
  InferAttributes<Specification>,
  InferCreationAttributes<Specification>
> {
  declare id: string;
  declare groupId: string;
  declare compoundId: string;
  declare grade: string;
  declare edition: number;
  declare decisionRule: 'simple' | 'guarded';
  declare criteria: unknown;
  declare note: CreationOptional<string | null>;
  declare writtenById: string;
  declare approvedById: CreationOptional<string | null>;
  declare approvedAt: CreationOptional<Date | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initSpecification(sequelize: Sequelize): void {
  Specification.init(
    {
      id: idColumn(),
      groupId: uuidColumn(),
      compoundId: uuidColumn(),
      grade: textColumn(),
      edition: integerColumn(),
      decisionRule: textColumn(),
      criteria: jsonColumn('criteria'),
      note: optional(textColumn()),
      writtenById: uuidColumn(),
      approvedById: optional(uuidColumn()),
      approvedAt: optional(instantColumn()),
      version: { ...integerColumn(), defaultValue: 0 },
      createdAt: instantColumn(),
      updatedAt: instantColumn(),
    },
    { sequelize, modelName: 'Specification', tableName: 'specifications', timestamps: true, version: true },
  );
}
