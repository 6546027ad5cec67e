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
  optional,
  textColumn,
  uuidColumn,
} from './columns';

/** One TLC plate of a run. */
export class Plate extends Model<InferAttributes<Plate>, InferCreationAttributes<Plate>> {
  declare id: string;
  declare groupId: string;
  declare runId: string;
  declare stationaryPhase: string;
  declare eluent: string;
  declare widthMm: CreationOptional<number | null>;
  declare heightMm: CreationOptional<number | null>;
  declare note: CreationOptional<string | null>;
  declare markedById: string;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initPlate(sequelize: Sequelize): void {
  Plate.init(
    {
      id: idColumn(),
      groupId: uuidColumn(),
      runId: uuidColumn(),
      stationaryPhase: textColumn(),
      eluent: textColumn(),
      widthMm: optional(doubleColumn()),
      heightMm: optional(doubleColumn()),
      note: optional(textColumn()),
      markedById: uuidColumn(),
      version: { ...integerColumn(), defaultValue: 0 },
      createdAt: instantColumn(),
      updatedAt: instantColumn(),
    },
    { sequelize, modelName: 'Plate', tableName: 'plates', timestamps: true, version: true },
  );
}
