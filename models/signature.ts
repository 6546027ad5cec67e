import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { idColumn, instantColumn, optional, textColumn, uuidColumn } from './columns';

/** A person's signature on a manifest. Superseded when something under it changes; never deleted. */
export class Signature extends Model<InferAttributes<Signature>, InferCreationAttributes<Signature>> {
  declare id: string;
  declare code: string;
  declare fractionId: string;
  declare signerId: string;
  declare signerName: string;
  declare role: string;
  declare meaning: string;
  declare comment: CreationOptional<string | null>;
  declare manifest: string;
  declare manifestDigest: string;
  declare verdictId: string;
  declare signedAt: Date;
  declare supersededAt: CreationOptional<Date | null>;
  declare supersededReason: CreationOptional<string | null>;
}

export function initSignature(sequelize: Sequelize): void {
  Signature.init(
    {
      id: idColumn(),
      code: textColumn(),
      fractionId: uuidColumn(),
      signerId: uuidColumn(),
      signerName: textColumn(),
      role: textColumn(),
      meaning: textColumn(),
      comment: optional(textColumn()),
      manifest: textColumn(),
      manifestDigest: textColumn(),
      verdictId: uuidColumn(),
      signedAt: instantColumn(),
      supersededAt: optional(instantColumn()),
      supersededReason: optional(textColumn()),
    },
    { sequelize, modelName: 'Signature', tableName: 'signatures', timestamps: false },
  );
}
