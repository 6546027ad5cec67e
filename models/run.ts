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

/** One distillation. */
export class Run extends Model<InferAttributes<Run>, InferCreationAttributes<Run>> {
  declare id: string;
  declare code: string;
  declare groupId: string;
  declare chemistId: string;
  declare targetCompoundId: string;
  declare technique: string;
  declare chargeMassG: number;
  declare chargeSource: string;
  declare chargeLot: CreationOptional<string | null>;
  declare columnStages: CreationOptional<number | null>;
  declare bath: CreationOptional<string | null>;
  declare bathTemperatureC: CreationOptional<number | null>;
  declare plannedPressureMbar: CreationOptional<number | null>;
  declare safetyChecks: Record<string, boolean>;
  declare residueMassG: CreationOptional<number | null>;
  declare note: CreationOptional<string | null>;
  declare startedAt: Date;
  declare endedAt: CreationOptional<Date | null>;
  declare nextFractionNumber: CreationOptional<number>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initRun(sequelize: Sequelize): void {
  Run.init(
    {
      id: idColumn(),
      code: textColumn(),
      groupId: uuidColumn(),
      chemistId: uuidColumn(),
      targetCompoundId: uuidColumn(),
      technique: textColumn(),
      chargeMassG: doubleColumn(),
      chargeSource: textColumn(),
      chargeLot: optional(textColumn()),
      columnStages: optional(doubleColumn()),
      bath: optional(textColumn()),
      bathTemperatureC: optional(doubleColumn()),
      plannedPressureMbar: optional(doubleColumn()),
      safetyChecks: jsonColumn('safetyChecks'),
      residueMassG: optional(doubleColumn()),
      note: optional(textColumn()),
      startedAt: instantColumn(),
      endedAt: optional(instantColumn()),
      nextFractionNumber: { ...integerColumn(), defaultValue: 1 },
      version: { ...integerColumn(), defaultValue: 0 },
      createdAt: instantColumn(),
      updatedAt: instantColumn(),
    },
    { sequelize, modelName: 'Run', tableName: 'runs', timestamps: true, version: true },
  );
}
