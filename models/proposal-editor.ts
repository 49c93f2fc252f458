import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** All who ever edited the proposal: they are barred from signing it. */
export class ProposalEditor extends Model<InferAttributes<ProposalEditor>, InferCreationAttributes<ProposalEditor>> {
  declare id: CreationOptional<number>;
  declare proposalId: number;
  declare userId: number;
  declare firstEditAt: string;
  declare lastEditAt: string;
}

ProposalEditor.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    proposalId: DataTypes.INTEGER,
    userId: DataTypes.INTEGER,
    firstEditAt: DataTypes.TEXT,
    lastEditAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "ProposalEditor", tableName: "proposal_editors" },
);
