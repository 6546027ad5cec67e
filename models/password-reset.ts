import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { idColumn, instantColumn, optional, textColumn, uuidColumn } from './columns';

/** A reset link that was mailed: only the hash of its token is kept. */
export class PasswordReset extends Model<
  InferAttributes<PasswordReset>,
  InferCreationAttributes<PasswordReset>
> {
  declare id: string;
  declare userId: string;
  declare tokenHash: string;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
}

export function initPasswordReset(sequelize: Sequelize): void {
  PasswordReset.init(
    {
      id: idColumn(),
      userId: uuidColumn(),
      tokenHash: textColumn(),
      expiresAt: instantColumn(),
      usedAt: optional(instantColumn()),
      createdAt: instantColumn(),
    },
    {
      sequelize,
      modelName: 'PasswordReset',
      tableName: 'password_resets',
      timestamps: true,
      updatedAt: false,
    },
  );
}
