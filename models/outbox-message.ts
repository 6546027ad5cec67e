import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { idColumn, instantColumn, integerColumn, optional, textColumn } from './columns';

/** An e-mail to be sent, written in the transaction that caused it. */
export class OutboxMessage extends Model<
  InferAttributes<OutboxMessage>,
  InferCreationAttributes<OutboxMessage>
> {
  declare id: string;
  declare kind: string;
  declare recipient: string;
  declare subject: string;
  declare body: string;
  declare attempts: CreationOptional<number>;
  declare nextAttemptAt: Date;
  declare sentAt: CreationOptional<Date | null>;
  declare lastError: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
}

export function initOutboxMessage(sequelize: Sequelize): void {
  OutboxMessage.init(
    {
      id: idColumn(),
      kind: textColumn(),
      recipient: textColumn(),
      subject: textColumn(),
      body: textColumn(),
      attempts: { ...integerColumn(), defaultValue: 0 },
      nextAttemptAt: instantColumn(),
      sentAt: optional(instantColumn()),
      lastError: optional(textColumn()),
      createdAt: instantColumn(),
    },
    {
      sequelize,
      modelName: 'OutboxMessage',
      tableName: 'outbox_messages',
      timestamps: true,
      updatedAt: false,
    },
  );
}
