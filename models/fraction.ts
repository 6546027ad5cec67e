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
  neverWritten,
  optional,
  textColumn,
  uuidColumn,
} from './columns';

/** One cut in one receiver. `netMassG` is computed by the database from gross and tare. */
export class Fraction extends Model<InferAttributes<Fraction>, InferCreationAttributes<Fraction>> {
  declare id: string;
  declare code: string;
  declare runId: string;
  declare groupId: string;
  declare compoundId: string;
  declare number: number;
  declare cut: 'fore-run' | 'heart' | 'tail' | 'residue' | 'trap';
  declare collectedById: string;
  declare collectedAt: Date;
  declare headTemperatureFromC: CreationOptional<number | null>;
  declare headTemperatureToC: CreationOptional<number | null>;
  declare pressureMbar: CreationOptional<number | null>;
  declare tareMassG: CreationOptional<number | null>;
  declare grossMassG: CreationOptional<number | null>;
  declare netMassG: CreationOptional<number | null>;
  declare appearance: CreationOptional<string | null>;
  declare storagePlace: CreationOptional<string | null>;
  declare status: CreationOptional<'open' | 'submitted' | 'returned' | 'signed off' | 'reopened'>;
  declare specificationId: CreationOptional<string | null>;
  declare verdictId: CreationOptional<string | null>;
  declare verdictState: CreationOptional<'pass' | 'fail' | 'inconclusive' | 'blind' | 'incomplete'>;
  declare purityPercent: CreationOptional<number | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initFraction(sequelize: Sequelize): void {
  Fraction.init(
    {
      id: idColumn(),
      code: textColumn(),
      runId: uuidColumn(),
      groupId: uuidColumn(),
      compoundId: uuidColumn(),
      number: integerColumn(),
      cut: textColumn(),
      collectedById: uuidColumn(),
      collectedAt: instantColumn(),
      headTemperatureFromC: optional(doubleColumn()),
      headTemperatureToC: optional(doubleColumn()),
      pressureMbar: optional(doubleColumn()),
      tareMassG: optional(doubleColumn()),
      grossMassG: optional(doubleColumn()),
      netMassG: { ...optional(doubleColumn()), set: neverWritten },
      appearance: optional(textColumn()),
      storagePlace: optional(textColumn()),
      status: { ...textColumn(), defaultValue: 'open' },
      specificationId: optional(uuidColumn()),
      verdictId: optional(uuidColumn()),
      verdictState: { ...textColumn(), defaultValue: 'incomplete' },
      purityPercent: optional(doubleColumn()),
      version: { ...integerColumn(), defaultValue: 0 },
      createdAt: instantColumn(),
      updatedAt: instantColumn(),
    },
    { sequelize, modelName: 'Fraction', tableName: 'fractions', timestamps: true, version: true },
  );
}
