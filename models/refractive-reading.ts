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
  jsonColumn,
  optional,
  textColumn,
  uuidColumn,
} from './columns';

/** Replicate readings of a refractometer and what the server made of them. */
export class RefractiveReading extends Model<
  InferAttributes<RefractiveReading>,
  InferCreationAttributes<RefractiveReading>
> {
  declare id: string;
  declare fractionId: string;
  declare readings: number[];
  declare temperatureC: number;
  declare wavelengthNm: number;
  declare waterReading: CreationOptional<number | null>;
  declare waterTemperatureC: CreationOptional<number | null>;
  declare instrument: CreationOptional<string | null>;
  declare result: Record<string, unknown>;
  declare state: 'pass' | 'fail' | 'inconclusive';
  declare methodVersion: string;
  declare readById: CreationOptional<string | null>;
  declare readByName: string;
  declare createdAt: CreationOptional<Date>;
}

export function initRefractiveReading(sequelize: Sequelize): void {
  RefractiveReading.init(
    {
      id: idColumn(),
      fractionId: uuidColumn(),
      readings: jsonColumn('readings'),
      temperatureC: doubleColumn(),
      wavelengthNm: doubleColumn(),
      waterReading: optional(doubleColumn()),
      waterTemperatureC: optional(doubleColumn()),
      instrument: optional(textColumn()),
      result: jsonColumn('result'),
      state: textColumn(),
      methodVersion: textColumn(),
      readById: optional(uuidColumn()),
      readByName: textColumn(),
      createdAt: instantColumn(),
    },
    {
      sequelize,
      modelName: 'RefractiveReading',
      tableName: 'refractive_readings',
      timestamps: true,
      updatedAt: false,
    },
  );
}
