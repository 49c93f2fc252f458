import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import type { LineKind } from "@/lib/vocabulary/lines";
import { database } from "./database";

/** Anything in a budget that has revisions; the number is reserved when a draft first adds it. */
export class Line extends Model<InferAttributes<Line>, InferCreationAttributes<Line>> {
  declare id: CreationOptional<number>;
  declare productId: number;
  declare kind: LineKind;
  declare number: string;
  declare reservedAt: string;
}

Line.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    productId: DataTypes.INTEGER,
    kind: DataTypes.TEXT,
    number: DataTypes.TEXT,
    reservedAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Line", tableName: "lines" },
);
