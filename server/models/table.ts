import { DataTypes, type Model, type ModelAttributeColumnOptions, type ModelStatic, type Sequelize } from 'sequelize';

/** A row read through Sequelize: its columns as properties, with Sequelize's own methods. */
export type RowModel<Row extends object> = Model<Row, Partial<Row>> & Row;
export type Table<Row extends object> = ModelStatic<RowModel<Row>>;
type Columns<Row> = { [K in keyof Row]-?: ModelAttributeColumnOptions };

/**
 * Declares a table for one connection. The schema itself lives in server/migrations; this only names the columns.
 * Stamps are written by the caller from the injected clock, never by Sequelize.
 */
export function table<Row extends object>(sequelize: Sequelize, name: string, columns: Columns<Row>): Table<Row> {
  return sequelize.define(name, columns as never, { tableName: name, underscored: true, timestamps: false, freezeTableName: true }) as unknown as Table<Row>;
}

/** A row's columns as they are now, on their own: Sequelize's plain object may be its inner one, which later changes with it. */
export const snapshot = <Row extends object>(row: RowModel<Row>): Row => ({ ...(row.get({ plain: true }) as Row) });

export const text = (length = 255): ModelAttributeColumnOptions => ({ type: DataTypes.STRING(length), allowNull: false });
export const textOrNull = (length = 255): ModelAttributeColumnOptions => ({ type: DataTypes.STRING(length), allowNull: true });
export const key = (): ModelAttributeColumnOptions => ({ type: DataTypes.CHAR(36), allowNull: false, primaryKey: true });
export const reference = (): ModelAttributeColumnOptions => ({ type: DataTypes.CHAR(36), allowNull: false });
export const referenceOrNull = (): ModelAttributeColumnOptions => ({ type: DataTypes.CHAR(36), allowNull: true });
export const number = (): ModelAttributeColumnOptions => ({ type: DataTypes.DOUBLE, allowNull: false });
export const numberOrNull = (): ModelAttributeColumnOptions => ({ type: DataTypes.DOUBLE, allowNull: true });
export const integer = (): ModelAttributeColumnOptions => ({ type: DataTypes.INTEGER, allowNull: false });
export const integerOrNull = (): ModelAttributeColumnOptions => ({ type: DataTypes.INTEGER, allowNull: true });
export const flag = (): ModelAttributeColumnOptions => ({ type: DataTypes.BOOLEAN, allowNull: false });
export const flagOrNull = (): ModelAttributeColumnOptions => ({ type: DataTypes.BOOLEAN, allowNull: true });
export const instant = (): ModelAttributeColumnOptions => ({ type: DataTypes.DATE(3), allowNull: false });
export const instantOrNull = (): ModelAttributeColumnOptions => ({ type: DataTypes.DATE(3), allowNull: true });
export const day = (): ModelAttributeColumnOptions => ({ type: DataTypes.DATEONLY, allowNull: false });

/** A column of JSON text, parsed on reading. */
export function jsonColumn(name: string): ModelAttributeColumnOptions {
  return {
    type: DataTypes.TEXT('long'),
    allowNull: true,
    get(this: Model) {
      const raw: unknown = this.getDataValue(name);
      return typeof raw === 'string' ? (JSON.parse(raw) as unknown) : (raw ?? null);
    },
    set(this: Model, value: unknown) {
      this.setDataValue(name, value === null || value === undefined ? null : JSON.stringify(value));
    },
  };
}
