import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { idColumn, instantColumn, integerColumn, textColumn } from './columns';

/** A research group or site. Everything below belongs to one. */
export class Group extends Model<InferAttributes<Group>, InferCreationAttributes<Group>> {
  declare id: string;
  declare name: string;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initGroup(sequelize: Sequelize): void {
  Group.init(
    {
      id: idColumn(),
      name: textColumn(),
      version: { ...integerColumn(), defaultValue: 0 },
      createdAt: instantColumn(),
      updatedAt: instantColumn(),
    },
    { sequelize, modelName: 'Group', tableName: 'groups', timestamps: true, version: true },
  );
}
