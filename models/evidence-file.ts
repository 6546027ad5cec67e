import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import {
  bigIntegerColumn,
  idColumn,
  instantColumn,
  integerColumn,
  optional,
  textColumn,
  uuidColumn,
} from './columns';

/** Facts about original bytes in the object store; the bytes never change. */
export class EvidenceFile extends Model<
  InferAttributes<EvidenceFile>,
  InferCreationAttributes<EvidenceFile>
> {
  declare id: string;
  declare groupId: string;
  declare runId: CreationOptional<string | null>;
  declare fractionId: CreationOptional<string | null>;
  declare kind: 'plate-photo' | 'gc-trace' | 'document';
  declare sha256: string;
  declare sizeBytes: number;
  declare mediaType: string;
  declare fileName: string;
  declare widthPx: CreationOptional<number | null>;
  declare heightPx: CreationOptional<number | null>;
  declare takenAt: CreationOptional<Date | null>;
  declare sentByKind: 'user' | 'token';
  declare sentById: string;
  declare sentByName: string;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initEvidenceFile(sequelize: Sequelize): void {
  EvidenceFile.init(
    {
      id: idColumn(),
      groupId: uuidColumn(),
      runId: optional(uuidColumn()),
      fractionId: optional(uuidColumn()),
      kind: textColumn(),
      sha256: textColumn(),
      sizeBytes: bigIntegerColumn(),
      mediaType: textColumn(),
      fileName: textColumn(),
      widthPx: optional(integerColumn()),
      heightPx: optional(integerColumn()),
      takenAt: optional(instantColumn()),
      sentByKind: textColumn(),
      sentById: uuidColumn(),
      sentByName: textColumn(),
      version: { ...integerColumn(), defaultValue: 0 },
      createdAt: instantColumn(),
      updatedAt: instantColumn(),
    },
    { sequelize, modelName: 'EvidenceFile', tableName: 'evidence_files', timestamps: true, version: true },
  );
}
