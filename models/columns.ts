import { DataTypes, type ModelAttributeColumnOptions } from 'sequelize';

// Sequelize writes into the objects that it is given, so each column gets a fresh one.
// MariaDB's UUID type stores 16 bytes and speaks in text, so text is what Sequelize is told.
export const idColumn = () => ({ type: DataTypes.STRING, primaryKey: true });
export const uuidColumn = () => ({ type: DataTypes.STRING, allowNull: false });
export const textColumn = () => ({ type: DataTypes.STRING, allowNull: false });
// Measured numbers are float64 from keyboard to disk: DOUBLE gives back the same bits, DECIMAL would not.
export const doubleColumn = () => ({ type: DataTypes.DOUBLE, allowNull: false });
export const integerColumn = () => ({ type: DataTypes.INTEGER, allowNull: false });
export const bigIntegerColumn = () => ({ type: DataTypes.BIGINT, allowNull: false });
export const booleanColumn = () => ({ type: DataTypes.BOOLEAN, allowNull: false });
export const instantColumn = () => ({ type: DataTypes.DATE(3), allowNull: false });

export function optional<T extends { allowNull: boolean }>(column: T): T {
  return { ...column, allowNull: true };
}

/** A JSON column that is read and written as a value, whatever the connector hands over. */
export function jsonColumn(name: string, allowNull = false): ModelAttributeColumnOptions {
  return {
    type: DataTypes.TEXT('long'),
    allowNull,
    get() {
      const raw: unknown = this.getDataValue(name);
      return typeof raw === 'string' ? JSON.parse(raw) : raw;
    },
    set(value: unknown) {
      this.setDataValue(name, value === null || value === undefined ? null : JSON.stringify(value));
    },
  };
}

/** For a column that the database computes. */
export function neverWritten(): void {
  throw new Error('netMassG is computed from gross and tare mass');
}
