import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import type { ProposalState } from "@/lib/vocabulary/proposals";
import { database } from "./database";

/** A change proposal with its working copy in ProposalEdit and ProposalTransfer. */
export class Proposal extends Model<InferAttributes<Proposal>, InferCreationAttributes<Proposal>> {
  declare id: CreationOptional<number>;
  declare productId: number;
  declare number: CreationOptional<number | null>;
  declare title: CreationOptional<string>;
  declare reason: CreationOptional<string>;
  declare evidence: CreationOptional<string>;
  declare neededBy: CreationOptional<string | null>;
  declare state: CreationOptional<ProposalState>;
  declare round: CreationOptional<number>;
  declare baseIssue: number;
  declare proposerId: number;
  declare lockVersion: CreationOptional<number>;
  declare createdAt: string;
  declare endedAt: CreationOptional<string | null>;
}

Proposal.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    productId: DataTypes.INTEGER,
    number: DataTypes.INTEGER,
    title: DataTypes.TEXT,
    reason: DataTypes.TEXT,
    evidence: DataTypes.TEXT,
    neededBy: DataTypes.TEXT,
    state: DataTypes.TEXT,
    round: DataTypes.INTEGER,
    baseIssue: DataTypes.INTEGER,
    proposerId: DataTypes.INTEGER,
    lockVersion: DataTypes.INTEGER,
    createdAt: DataTypes.TEXT,
    endedAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Proposal", tableName: "proposals" },
);
