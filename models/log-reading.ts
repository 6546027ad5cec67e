import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { doubleColumn, idColumn, instantColumn, optional, textColumn, uuidColumn } from './columns';

/** What the thermometers, the gauge and the receiver said at one moment of a run. */
export class LogReading extends Model<InferAttributes<LogReading>, InferCreationAttributes<LogReading>> {
  declare id: string;
  declare runId: string;
  declare at: Date;
  declare headTemperatureC: CreationOptional<number | null>;
  declare bathTemperatureC: CreationOptional<number | null>;
  declare pressureMbar: CreationOptional<number | null>;
  declare volumeMl: CreationOptional<number | null>;
  declare note: CreationOptional<string | null>;
  declare sentByKind: 'user' | 'token';
  declare sentById: string;
  declare createdAt: CreationOptional<Date>;
}

export function initLogReading(sequelize: Sequelize): void {
  LogReading.init(
    {
      id: idColumn(),
      runId: uuidColumn(),
      at: instantColumn(),
      headTemperatureC: optional(doubleColumn()),
      bathTemperatureC: optional(doubleColumn()),
      pressureMbar: optional(doubleColumn()),
      volumeMl: optional(doubleColumn()),
      note: optional(textColumn()),
      sentByKind: textColumn(),
      sentById: uuidColumn(),
      createdAt: instantColumn(),
    },
    { sequelize, modelName: 'LogReading', tableName: 'log_readings', timestamps: true, updatedAt: false },
  );
}
