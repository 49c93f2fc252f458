import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** What an item came to at an operating point, from its issue until the next row of the pair. */
export class Result extends Model<InferAttributes<Result>, InferCreationAttributes<Result>> {
  declare id: CreationOptional<number>;
  declare productId: number;
  declare itemId: number;
  declare operatingPointId: number;
  declare issue: number;
  declare methodVersion: number;
  declare basic: number;
  declare growthFraction: number;
  declare growth: number;
  declare predicted: number;
  declare notes: string;
  declare answer: string;
}

Result.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    productId: DataTypes.INTEGER,
    itemId: DataTypes.INTEGER,
    operatingPointId: DataTypes.INTEGER,
    issue: DataTypes.INTEGER,
    methodVersion: DataTypes.INTEGER,
    basic: DataTypes.REAL,
    growthFraction: DataTypes.REAL,
    growth: DataTypes.REAL,
    predicted: DataTypes.REAL,
    notes: DataTypes.TEXT,
    answer: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Result", tableName: "results" },
);
