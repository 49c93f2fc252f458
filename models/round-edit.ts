import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import type { EditOperation } from "@/lib/vocabulary/lines";
import { database } from "./database";

/** One edit as it was submitted. */
export class RoundEdit extends Model<InferAttributes<RoundEdit>, InferCreationAttributes<RoundEdit>> {
  declare id: CreationOptional<number>;
  declare roundId: number;
  declare position: number;
  declare lineId: number;
  declare operation: EditOperation;
  declare baseLetter: CreationOptional<string | null>;
  declare body: CreationOptional<string | null>;
}

RoundEdit.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    roundId: DataTypes.INTEGER,
    position: DataTypes.INTEGER,
    lineId: DataTypes.INTEGER,
    operation: DataTypes.TEXT,
    baseLetter: DataTypes.TEXT,
    body: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "RoundEdit", tableName: "round_edits" },
);
