import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { idColumn, instantColumn, integerColumn, optional, textColumn, uuidColumn } from './columns';

/** A read-only link to one fraction for somebody without an account; it expires. */
export class Share extends Model<InferAttributes<Share>, InferCreationAttributes<Share>> {
  declare id: string;
  declare fractionId: string;
  declare tokenHash: string;
  declare recipient: CreationOptional<string | null>;
  declare expiresAt: Date;
  declare revokedAt: CreationOptional<Date | null>;
  declare madeById: string;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initShare(sequelize: Sequelize): void {
  Share.init(
    {
      id: idColumn(),
      fractionId: uuidColumn(),
      tokenHash: textColumn(),
      recipient: optional(textColumn()),
      expiresAt: instantColumn(),
      revokedAt: optional(instantColumn()),
      madeById: uuidColumn(),
      version: { ...integerColumn(), defaultValue: 0 },
      createdAt: instantColumn(),
      updatedAt: instantColumn(),
    },
    { sequelize, modelName: 'Share', tableName: 'shares', timestamps: true, version: true },
  );
}
