import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import type { EditOperation } from "@/lib/vocabulary/lines";
import { database } from "./database";

/** Working copy of one edit; the body is as typed and may be incomplete. */
export class ProposalEdit extends Model<InferAttributes<ProposalEdit>, InferCreationAttributes<ProposalEdit>> {
  declare id: CreationOptional<number>;
  declare proposalId: number;
  declare position: number;
  declare lineId: number;
  declare operation: EditOperation;
  declare baseLetter: CreationOptional<string | null>;
  declare body: CreationOptional<string | null>;
  /** Who changed which field, as JSON. */
  declare touched: CreationOptional<string>;
}

ProposalEdit.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    proposalId: DataTypes.INTEGER,
    position: DataTypes.INTEGER,
    lineId: DataTypes.INTEGER,
    operation: DataTypes.TEXT,
    baseLetter: DataTypes.TEXT,
    body: DataTypes.TEXT,
    touched: { type: DataTypes.TEXT, defaultValue: "{}" },
  },
  { sequelize: database, modelName: "ProposalEdit", tableName: "proposal_edits" },
);
