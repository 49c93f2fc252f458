import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import type { Capacity } from "@/lib/vocabulary/roles";
import { database } from "./database";

/** One submission, kept as it was. `submittedAs` is the capacity signed by submitting it. */
export class Round extends Model<InferAttributes<Round>, InferCreationAttributes<Round>> {
  declare id: CreationOptional<number>;
  declare proposalId: number;
  declare number: number;
  declare baseIssue: number;
  declare title: string;
  declare reason: string;
  declare evidence: string;
  declare neededBy: CreationOptional<string | null>;
  declare rules: string;
  declare canonicalText: string;
  declare hash: string;
  declare submittedById: number;
  declare submittedAs: CreationOptional<Capacity | null>;
  declare submittedAt: string;
}

Round.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    proposalId: DataTypes.INTEGER,
    number: DataTypes.INTEGER,
    baseIssue: DataTypes.INTEGER,
    title: DataTypes.TEXT,
    reason: DataTypes.TEXT,
    evidence: DataTypes.TEXT,
    neededBy: DataTypes.TEXT,
    rules: DataTypes.TEXT,
    canonicalText: DataTypes.TEXT,
    hash: DataTypes.TEXT,
    submittedById: DataTypes.INTEGER,
    submittedAs: DataTypes.TEXT,
    submittedAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Round", tableName: "rounds" },
);
