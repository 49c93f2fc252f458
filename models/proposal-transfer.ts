import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** Working copy of one transfer of allocation, as canonical JSON text. */
export class ProposalTransfer extends Model<
  InferAttributes<ProposalTransfer>,
  InferCreationAttributes<ProposalTransfer>
> {
  declare id: CreationOptional<number>;
  declare proposalId: number;
  declare position: number;
  declare body: string;
}

ProposalTransfer.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    proposalId: DataTypes.INTEGER,
    position: DataTypes.INTEGER,
    body: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "ProposalTransfer", tableName: "proposal_transfers" },
);
