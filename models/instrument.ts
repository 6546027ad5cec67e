import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { idColumn, instantColumn, integerColumn, optional, textColumn, uuidColumn } from './columns';

/** A machine that sends evidence, such as a gas chromatograph with its PC. */
export class Instrument extends Model<InferAttributes<Instrument>, InferCreationAttributes<Instrument>> {
  declare id: string;
  declare groupId: string;
  declare name: string;
  declare kind: string;
  declare serialNumber: CreationOptional<string | null>;
  declare place: CreationOptional<string | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initInstrument(sequelize: Sequelize): void {
  Instrument.init(
    {
      id: idColumn(),
      groupId: uuidColumn(),
      name: textColumn(),
      kind: textColumn(),
      serialNumber: optional(textColumn()),
      place: optional(textColumn()),
      version: { ...integerColumn(), defaultValue: 0 },
      createdAt: instantColumn(),
      updatedAt: instantColumn(),
    },
    { sequelize, modelName: 'Instrument', tableName: 'instruments', timestamps: true, version: true },
  );
}
