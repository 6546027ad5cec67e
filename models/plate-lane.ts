import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { doubleColumn, idColumn, integerColumn, optional, textColumn, uuidColumn } from './columns';

/** One lane of a plate and what was spotted on it. */
export class PlateLane extends Model<InferAttributes<PlateLane>, InferCreationAttributes<PlateLane>> {
  declare id: string;
  declare plateId: string;
  declare position: number;
  declare label: string;
  declare subjectKind: 'fraction' | 'crude' | 'reference' | 'co-spot' | 'blank';
  declare fractionId: CreationOptional<string | null>;
  declare compoundId: CreationOptional<string | null>;
  /** What was spotted holds this much of the undiluted sample, % by mass; null for the sample itself. */
  declare dilutionPercent: CreationOptional<number | null>;
}

export function initPlateLane(sequelize: Sequelize): void {
  PlateLane.init(
    {
      id: idColumn(),
      plateId: uuidColumn(),
      position: integerColumn(),
      label: textColumn(),
      subjectKind: textColumn(),
      fractionId: optional(uuidColumn()),
      compoundId: optional(uuidColumn()),
      dilutionPercent: optional(doubleColumn()),
    },
    { sequelize, modelName: 'PlateLane', tableName: 'plate_lanes', timestamps: false },
  );
}
