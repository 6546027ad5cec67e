import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  DataTypes,
  Model,
  type Sequelize,
} from 'sequelize';
import { instantColumn, integerColumn, optional } from './columns';

/** Failed sign-ins of one account or address, shared by every instance of the app. */
export class SignInThrottle extends Model<
  InferAttributes<SignInThrottle>,
  InferCreationAttributes<SignInThrottle>
> {
  declare subject: string;
  declare failures: number;
  declare lockedUntil: CreationOptional<Date | null>;
  declare updatedAt: CreationOptional<Date>;
}

export function initSignInThrottle(sequelize: Sequelize): void {
  SignInThrottle.init(
    {
      subject: { type: DataTypes.STRING, primaryKey: true },
      failures: integerColumn(),
      lockedUntil: optional(instantColumn()),
      updatedAt: instantColumn(),
    },
    {
      sequelize,
      modelName: 'SignInThrottle',
      tableName: 'sign_in_throttles',
      timestamps: true,
      createdAt: false,
    },
  );
}
