import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { doubleColumn, idColumn, instantColumn, integerColumn, optional, textColumn } from './columns';

/** A chemical compound that a fraction may hold. Shared by all groups. */
export class Compound extends Model<InferAttributes<Compound>, InferCreationAttributes<Compound>> {
  declare id: string;
  declare name: string;
  declare casNumber: CreationOptional<string | null>;
  declare formula: CreationOptional<string | null>;
  declare molarMassGMol: CreationOptional<number | null>;
  declare smiles: CreationOptional<string | null>;
  declare inchiKey: CreationOptional<string | null>;
  declare peroxideClass: CreationOptional<'A' | 'B' | 'C' | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initCompound(sequelize: Sequelize): void {
  Compound.init(
    {
      id: idColumn(),
      name: textColumn(),
      casNumber: optional(textColumn()),
      formula: optional(textColumn()),
      molarMassGMol: optional(doubleColumn()),
      smiles: optional(textColumn()),
      inchiKey: optional(textColumn()),
      peroxideClass: optional(textColumn()),
      version: { ...integerColumn(), defaultValue: 0 },
      createdAt: instantColumn(),
      updatedAt: instantColumn(),
    },
    { sequelize, modelName: 'Compound', tableName: 'compounds', timestamps: true, version: true },
  );
}
