import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import type { ProductKind } from "@/lib/vocabulary/lines";
import { database } from "./database";

/** A thing with a drag budget. */
export class Product extends Model<InferAttributes<Product>, InferCreationAttributes<Product>> {
  declare id: CreationOptional<number>;
  declare code: string;
  declare name: string;
  declare kind: ProductKind;
  declare timeZone: string;
  declare nextProposalNumber: CreationOptional<number>;
  declare createdAt: string;
}

Product.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    code: DataTypes.TEXT,
    name: DataTypes.TEXT,
    kind: DataTypes.TEXT,
    timeZone: DataTypes.TEXT,
    nextProposalNumber: DataTypes.INTEGER,
    createdAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Product", tableName: "products" },
);
