import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** An issue of a budget; `chainSequence` and `chainHash` are the head of the chain before the act that made it. */
export class Issue extends Model<InferAttributes<Issue>, InferCreationAttributes<Issue>> {
  declare id: CreationOptional<number>;
  declare productId: number;
  declare number: number;
  declare proposalId: CreationOptional<number | null>;
  declare madeAt: string;
  declare totals: string;
  declare uncertainty: CreationOptional<string | null>;
  declare contentHash: string;
  declare chainSequence: number;
  declare chainHash: string;
}

Issue.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    productId: DataTypes.INTEGER,
    number: DataTypes.INTEGER,
    proposalId: DataTypes.INTEGER,
    madeAt: DataTypes.TEXT,
    totals: DataTypes.TEXT,
    uncertainty: DataTypes.TEXT,
    contentHash: DataTypes.TEXT,
    chainSequence: DataTypes.INTEGER,
    chainHash: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Issue", tableName: "issues" },
);
