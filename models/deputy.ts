import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** Who stands in for whom, for a range of days in the product's time zone. */
export class Deputy extends Model<InferAttributes<Deputy>, InferCreationAttributes<Deputy>> {
  declare id: CreationOptional<number>;
  declare productId: number;
  declare holderId: number;
  declare deputyId: number;
  declare fromDay: string;
  declare untilDay: string;
  declare namedById: number;
  declare namedAt: string;
  declare endedAt: CreationOptional<string | null>;
}

Deputy.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    productId: DataTypes.INTEGER,
    holderId: DataTypes.INTEGER,
    deputyId: DataTypes.INTEGER,
    fromDay: DataTypes.TEXT,
    untilDay: DataTypes.TEXT,
    namedById: DataTypes.INTEGER,
    namedAt: DataTypes.TEXT,
    endedAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Deputy", tableName: "deputies" },
);
