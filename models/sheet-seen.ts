import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** What a person last saw of a change sheet, and what they had seen before. */
export class SheetSeen extends Model<InferAttributes<SheetSeen>, InferCreationAttributes<SheetSeen>> {
  declare id: CreationOptional<number>;
  declare userId: number;
  declare proposalId: number;
  declare seen: string;
  declare lastAt: string;
  declare earlier: CreationOptional<string | null>;
  declare earlierAt: CreationOptional<string | null>;
}

SheetSeen.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    userId: DataTypes.INTEGER,
    proposalId: DataTypes.INTEGER,
    seen: DataTypes.TEXT,
    lastAt: DataTypes.TEXT,
    earlier: DataTypes.TEXT,
    earlierAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "SheetSeen", tableName: "sheets_seen" },
);
