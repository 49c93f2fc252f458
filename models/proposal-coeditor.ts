import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** Whom the proposer let see and edit the draft. */
export class ProposalCoeditor extends Model<
  InferAttributes<ProposalCoeditor>,
  InferCreationAttributes<ProposalCoeditor>
> {
  declare id: CreationOptional<number>;
  declare proposalId: number;
  declare userId: number;
  declare namedById: number;
  declare namedAt: string;
  declare endedAt: CreationOptional<string | null>;
}

ProposalCoeditor.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    proposalId: DataTypes.INTEGER,
    userId: DataTypes.INTEGER,
    namedById: DataTypes.INTEGER,
    namedAt: DataTypes.TEXT,
    endedAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "ProposalCoeditor", tableName: "proposal_coeditors" },
);
