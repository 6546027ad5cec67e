import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { idColumn, instantColumn, textColumn, uuidColumn } from './columns';

/** One role of one person in one group. */
export class Membership extends Model<InferAttributes<Membership>, InferCreationAttributes<Membership>> {
  declare id: string;
  declare userId: string;
  declare groupId: string;
  declare role: 'chemist' | 'analyst' | 'pi';
  declare createdAt: CreationOptional<Date>;
}

export function initMembership(sequelize: Sequelize): void {
  Membership.init(
    {
      id: idColumn(),
      userId: uuidColumn(),
      groupId: uuidColumn(),
      role: textColumn(),
      createdAt: instantColumn(),
    },
    { sequelize, modelName: 'Membership', tableName: 'memberships', timestamps: true, updatedAt: false },
  );
}
