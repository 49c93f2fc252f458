import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** An issue with a name and a purpose. */
export class Baseline extends Model<InferAttributes<Baseline>, InferCreationAttributes<Baseline>> {
  declare id: CreationOptional<number>;
  declare productId: number;
  declare issue: number;
  declare name: string;
  declare purpose: string;
  declare signerId: number;
  declare madeAt: string;
}

Baseline.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    productId: DataTypes.INTEGER,
    issue: DataTypes.INTEGER,
    name: DataTypes.TEXT,
    purpose: DataTypes.TEXT,
    signerId: DataTypes.INTEGER,
    madeAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Baseline", tableName: "baselines" },
);
