import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import {
  booleanColumn,
  doubleColumn,
  idColumn,
  instantColumn,
  integerColumn,
  jsonColumn,
  optional,
  textColumn,
  uuidColumn,
} from './columns';

/** A published value with its conditions and source. A correction is a new row; the old one stays. */
export class LiteratureValue extends Model<
  InferAttributes<LiteratureValue>,
  InferCreationAttributes<LiteratureValue>
> {
  declare id: string;
  declare compoundId: string;
  declare property: string;
  declare value: CreationOptional<number | null>;
  declare coefficients: CreationOptional<Record<string, number> | null>;
  declare unit: string;
  declare temperatureC: CreationOptional<number | null>;
  declare pressureKPa: CreationOptional<number | null>;
  declare wavelengthNm: CreationOptional<number | null>;
  declare rangeMinC: CreationOptional<number | null>;
  declare rangeMaxC: CreationOptional<number | null>;
  declare uncertainty: CreationOptional<number | null>;
  declare source: string;
  declare note: CreationOptional<string | null>;
  declare preferred: CreationOptional<boolean>;
  declare replacesId: CreationOptional<string | null>;
  declare replacedAt: CreationOptional<Date | null>;
  declare reason: CreationOptional<string | null>;
  declare addedById: CreationOptional<string | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initLiteratureValue(sequelize: Sequelize): void {
  LiteratureValue.init(
    {
      id: idColumn(),
      compoundId: uuidColumn(),
      property: textColumn(),
      value: optional(doubleColumn()),
      coefficients: jsonColumn('coefficients', true),
      unit: textColumn(),
      temperatureC: optional(doubleColumn()),
      pressureKPa: optional(doubleColumn()),
      wavelengthNm: optional(doubleColumn()),
      rangeMinC: optional(doubleColumn()),
      rangeMaxC: optional(doubleColumn()),
      uncertainty: optional(doubleColumn()),
      source: textColumn(),
      note: optional(textColumn()),
      preferred: { ...booleanColumn(), defaultValue: false },
      replacesId: optional(uuidColumn()),
      replacedAt: optional(instantColumn()),
      reason: optional(textColumn()),
      addedById: optional(uuidColumn()),
      version: { ...integerColumn(), defaultValue: 0 },
      createdAt: instantColumn(),
      updatedAt: instantColumn(),
    },
    {
      sequelize,
      modelName: 'LiteratureValue',
      tableName: 'literature_values',
      timestamps: true,
      version: true,
    },
  );
}
