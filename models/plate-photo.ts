import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { idColumn, instantColumn, jsonColumn, textColumn, uuidColumn } from './columns';

/** A point in the units of the photo's marks, origin top left. */
export type Point = { x: number; y: number };

/** A photo of a plate under one visualiser, with its own marks. */
export class PlatePhoto extends Model<InferAttributes<PlatePhoto>, InferCreationAttributes<PlatePhoto>> {
  declare id: string;
  declare plateId: string;
  declare evidenceId: string;
  declare visualiser: string;
  declare units: 'px' | 'mm';
  declare corners: CreationOptional<Point[] | null>;
  declare baseline: Point[];
  declare front: Point[];
  /** Where each lane lies across this photo, in the order of the lanes; null where that was not marked. */
  declare laneX: (number | null)[];
  declare flags: string[];
  /** The marks that the server proposed before a person marked the photo, as they were proposed. */
  declare proposal: CreationOptional<object | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initPlatePhoto(sequelize: Sequelize): void {
  PlatePhoto.init(
    {
      id: idColumn(),
      plateId: uuidColumn(),
      evidenceId: uuidColumn(),
      visualiser: textColumn(),
      units: textColumn(),
      corners: jsonColumn('corners', true),
      baseline: jsonColumn('baseline'),
      front: jsonColumn('front'),
      laneX: jsonColumn('laneX'),
      flags: jsonColumn('flags'),
      proposal: jsonColumn('proposal', true),
      createdAt: instantColumn(),
      updatedAt: instantColumn(),
    },
    { sequelize, modelName: 'PlatePhoto', tableName: 'plate_photos', timestamps: true },
  );
}
