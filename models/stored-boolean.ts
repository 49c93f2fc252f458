import { DataTypes, type Model, type ModelAttributeColumnOptions } from "sequelize";

/** SQLite's strict tables know no booleans: stored as 0 or 1, read as false or true (not by `raw` queries). */
export function storedBoolean(column: string): ModelAttributeColumnOptions {
  return {
    type: DataTypes.BOOLEAN,
    get(this: Model) {
      const stored: unknown = this.getDataValue(column);
      return stored === undefined ? undefined : Boolean(stored);
    },
  };
}
