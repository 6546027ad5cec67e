import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { booleanColumn, idColumn, instantColumn, integerColumn, optional, textColumn } from './columns';

/** An account. Rights come from its memberships, read on each request. */
export class User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
  declare id: string;
  declare email: string;
  declare name: string;
  declare passwordHash: string;
  declare mustChangePassword: CreationOptional<boolean>;
  declare isAdmin: CreationOptional<boolean>;
  declare sessionVersion: CreationOptional<number>;
  declare disabledAt: CreationOptional<Date | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initUser(sequelize: Sequelize): void {
  User.init(
    {
      id: idColumn(),
      email: textColumn(),
      name: textColumn(),
      passwordHash: textColumn(),
      mustChangePassword: { ...booleanColumn(), defaultValue: false },
      isAdmin: { ...booleanColumn(), defaultValue: false },
      sessionVersion: { ...integerColumn(), defaultValue: 1 },
      disabledAt: optional(instantColumn()),
      version: { ...integerColumn(), defaultValue: 0 },
      createdAt: instantColumn(),
      updatedAt: instantColumn(),
    },
    { sequelize, modelName: 'User', tableName: 'users', timestamps: true, version: true },
  );
}
