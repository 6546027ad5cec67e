import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import {
  doubleColumn,
  idColumn,
  instantColumn,
  integerColumn,
  jsonColumn,
  optional,
  textColumn,
  uuidColumn,
} from './columns';

/** A gas chromatogram read from an evidence file. */
export class Trace extends Model<InferAttributes<Trace>, InferCreationAttributes<Trace>> {
  declare id: string;
  declare groupId: string;
  declare runId: string;
  declare fractionId: CreationOptional<string | null>;
  declare evidenceId: string;
  declare subject: 'fraction' | 'crude' | 'blank' | 'reference';
  declare detector: string;
  declare readOptions: Record<string, unknown>;
  declare detected: Record<string, unknown>;
  declare pointCount: number;
  declare startMin: number;
  declare durationMin: number;
  declare inForceIntegrationId: CreationOptional<string | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initTrace(sequelize: Sequelize): void {
  Trace.init(
    {
      id: idColumn(),
      groupId: uuidColumn(),
      runId: uuidColumn(),
      fractionId: optional(uuidColumn()),
      evidenceId: uuidColumn(),
      subject: textColumn(),
      detector: textColumn(),
      readOptions: jsonColumn('readOptions'),
      detected: jsonColumn('detected'),
      pointCount: integerColumn(),
      startMin: doubleColumn(),
      durationMin: doubleColumn(),
      inForceIntegrationId: optional(uuidColumn()),
      version: { ...integerColumn(), defaultValue: 0 },
      createdAt: instantColumn(),
      updatedAt: instantColumn(),
    },
    { sequelize, modelName: 'Trace', tableName: 'traces', timestamps: true, version: true },
  );
}
