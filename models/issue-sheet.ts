import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** The sheet of an issue at one of its operating points, compressed; made from what the issue keeps. */
export class IssueSheet extends Model<InferAttributes<IssueSheet>, InferCreationAttributes<IssueSheet>> {
  declare id: CreationOptional<number>;
  declare productId: number;
  declare issue: number;
  declare operatingPoint: string;
  declare recipe: number;
  declare sha256: string;
  declare bytes: Buffer;
}

IssueSheet.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    productId: DataTypes.INTEGER,
    issue: DataTypes.INTEGER,
    operatingPoint: DataTypes.TEXT,
    recipe: DataTypes.INTEGER,
    sha256: DataTypes.TEXT,
    bytes: DataTypes.BLOB,
  },
  { sequelize: database, modelName: "IssueSheet", tableName: "issue_sheets" },
);
