import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { doubleColumn, idColumn, integerColumn, jsonColumn, optional, uuidColumn } from './columns';

/** One peak of one integration. */
export class Peak extends Model<InferAttributes<Peak>, InferCreationAttributes<Peak>> {
  declare id: string;
  declare integrationId: string;
  declare number: number;
  declare retentionTimeMin: number;
  declare startMin: number;
  declare endMin: number;
  declare area: number;
  declare areaPercent: number;
  declare height: number;
  declare widthHalfMin: CreationOptional<number | null>;
  declare tailing: CreationOptional<number | null>;
  declare plates: CreationOptional<number | null>;
  declare resolution: CreationOptional<number | null>;
  declare signalToNoise: CreationOptional<number | null>;
  declare flags: string[];
  declare compoundId: CreationOptional<string | null>;
}

export function initPeak(sequelize: Sequelize): void {
  Peak.init(
    {
      id: idColumn(),
      integrationId: uuidColumn(),
      number: integerColumn(),
      retentionTimeMin: doubleColumn(),
      startMin: doubleColumn(),
      endMin: doubleColumn(),
      area: doubleColumn(),
      areaPercent: doubleColumn(),
      height: doubleColumn(),
      widthHalfMin: optional(doubleColumn()),
      tailing: optional(doubleColumn()),
      plates: optional(doubleColumn()),
      resolution: optional(doubleColumn()),
      signalToNoise: optional(doubleColumn()),
      flags: jsonColumn('flags'),
      compoundId: optional(uuidColumn()),
    },
    { sequelize, modelName: 'Peak', tableName: 'peaks', timestamps: false },
  );
}
