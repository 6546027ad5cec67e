import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { idColumn, instantColumn, integerColumn, optional, textColumn, uuidColumn } from './columns';

/** A file that waits for somebody to say which fraction it belongs to. */
export class TrayItem extends Model<InferAttributes<TrayItem>, InferCreationAttributes<TrayItem>> {
  declare id: string;
  declare groupId: string;
  declare evidenceId: string;
  declare instrumentId: CreationOptional<string | null>;
  declare askedFor: CreationOptional<string | null>;
  declare reason: string;
  declare filedAt: CreationOptional<Date | null>;
  declare filedById: CreationOptional<string | null>;
  declare fractionId: CreationOptional<string | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initTrayItem(sequelize: Sequelize): void {
  TrayItem.init(
    {
      id: idColumn(),
      groupId: uuidColumn(),
      evidenceId: uuidColumn(),
      instrumentId: optional(uuidColumn()),
      askedFor: optional(textColumn()),
      reason: textColumn(),
      filedAt: optional(instantColumn()),
      filedById: optional(uuidColumn()),
      fractionId: optional(uuidColumn()),
      version: { ...integerColumn(), defaultValue: 0 },
      createdAt: instantColumn(),
      updatedAt: instantColumn(),
    },
    { sequelize, modelName: 'TrayItem', tableName: 'tray_items', timestamps: true, version: true },
  );
}
