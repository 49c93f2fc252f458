import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import type { Outcome } from "@/lib/vocabulary/acts";
import { database } from "./database";

/** One act, done or refused, in its chain. */
export class HistoryEntry extends Model<InferAttributes<HistoryEntry>, InferCreationAttributes<HistoryEntry>> {
  declare id: CreationOptional<number>;
  declare chain: string;
  declare sequence: number;
  declare at: string;
  declare personId: CreationOptional<number | null>;
  declare printedName: string;
  declare capacity: CreationOptional<string | null>;
  declare act: string;
  declare subjectType: string;
  declare subjectId: string;
  declare subjectLabel: string;
  declare was: CreationOptional<string | null>;
  declare now: CreationOptional<string | null>;
  declare reason: CreationOptional<string | null>;
  declare outcome: Outcome;
  declare canonicalText: string;
  declare previousHash: string;
  declare hash: string;
}

HistoryEntry.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    chain: DataTypes.TEXT,
    sequence: DataTypes.INTEGER,
    at: DataTypes.TEXT,
    personId: DataTypes.INTEGER,
    printedName: DataTypes.TEXT,
    capacity: DataTypes.TEXT,
    act: DataTypes.TEXT,
    subjectType: DataTypes.TEXT,
    subjectId: DataTypes.TEXT,
    subjectLabel: DataTypes.TEXT,
    was: DataTypes.TEXT,
    now: DataTypes.TEXT,
    reason: DataTypes.TEXT,
    outcome: DataTypes.TEXT,
    canonicalText: DataTypes.TEXT,
    previousHash: DataTypes.TEXT,
    hash: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "HistoryEntry", tableName: "history_entries" },
);
