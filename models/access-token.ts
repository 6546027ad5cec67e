import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { idColumn, instantColumn, jsonColumn, optional, textColumn, uuidColumn } from './columns';

/** The narrow rights of an instrument PC. Only the SHA-256 of the token is kept. */
export class AccessToken extends Model<InferAttributes<AccessToken>, InferCreationAttributes<AccessToken>> {
  declare id: string;
  declare instrumentId: string;
  declare name: string;
  declare tokenHash: string;
  declare hint: string;
  declare scopes: string[];
  declare expiresAt: Date;
  declare revokedAt: CreationOptional<Date | null>;
  declare lastSeenAt: CreationOptional<Date | null>;
  declare madeById: string;
  declare createdAt: CreationOptional<Date>;
}

export function initAccessToken(sequelize: Sequelize): void {
  AccessToken.init(
    {
      id: idColumn(),
      instrumentId: uuidColumn(),
      name: textColumn(),
      tokenHash: textColumn(),
      hint: textColumn(),
      scopes: jsonColumn('scopes'),
      expiresAt: instantColumn(),
      revokedAt: optional(instantColumn()),
      lastSeenAt: optional(instantColumn()),
      madeById: uuidColumn(),
      createdAt: instantColumn(),
    },
    { sequelize, modelName: 'AccessToken', tableName: 'access_tokens', timestamps: true, updatedAt: false },
  );
}
