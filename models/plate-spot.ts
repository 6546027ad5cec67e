import { type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';
import { doubleColumn, idColumn, integerColumn, jsonColumn, uuidColumn } from './columns';

/** One spot, where it was marked in a photo, and its Rf. */
export class PlateSpot extends Model<InferAttributes<PlateSpot>, InferCreationAttributes<PlateSpot>> {
  declare id: string;
  declare laneId: string;
  declare photoId: string;
  declare position: number;
  declare x: number;
  declare y: number;
  declare rf: number;
  declare rfUncertainty: number;
  declare flags: string[];
}

export function initPlateSpot(sequelize: Sequelize): void {
  PlateSpot.init(
    {
      id: idColumn(),
      laneId: uuidColumn(),
      photoId: uuidColumn(),
      position: integerColumn(),
      x: doubleColumn(),
      y: doubleColumn(),
      rf: doubleColumn(),
      rfUncertainty: doubleColumn(),
      flags: jsonColumn('flags'),
    },
    { sequelize, modelName: 'PlateSpot', tableName: 'plate_spots', timestamps: false },
  );
}
