import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { idColumn, instantColumn, optional, textColumn, uuidColumn } from './columns';

/** One step in the life of a fraction: who, when, why. */
export class FractionTransition extends Model<
  InferAttributes<FractionTransition>,
  InferCreationAttributes<FractionTransition>
> {
  declare id: string;
  declare fractionId: string;
  declare action: 'submit' | 'return' | 'resume' | 'sign off' | 'reopen' | 'supersede';
  declare fromStatus: string;
  declare toStatus: string;
  declare reason: CreationOptional<string | null>;
  declare actorId: CreationOptional<string | null>;
  declare actorName: string;
  declare at: Date;
}

export function initFractionTransition(sequelize: Sequelize): void {
  FractionTransition.init(
    {
      id: idColumn(),
      fractionId: uuidColumn(),
      action: textColumn(),
      fromStatus: textColumn(),
      toStatus: textColumn(),
      reason: optional(textColumn()),
      actorId: optional(uuidColumn()),
      actorName: textColumn(),
      at: instantColumn(),
    },
    { sequelize, modelName: 'FractionTransition', tableName: 'fraction_transitions', timestamps: false },
  );
}
