import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { storedBoolean } from "./stored-boolean";
import { database } from "./database";

/** An immutable state of a line, valid from its issue until the next. `body` is canonical JSON text. */
export class LineRevision extends Model<InferAttributes<LineRevision>, InferCreationAttributes<LineRevision>> {
  declare id: CreationOptional<number>;
  declare productId: number;
  declare lineId: number;
  declare letter: string;
  declare issue: number;
  declare retired: CreationOptional<boolean>;
  declare body: string;
  declare hash: string;
  declare proposalId: CreationOptional<number | null>;
}

LineRevision.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    productId: DataTypes.INTEGER,
    lineId: DataTypes.INTEGER,
    letter: DataTypes.TEXT,
    issue: DataTypes.INTEGER,
    retired: storedBoolean("retired"),
    body: DataTypes.TEXT,
    hash: DataTypes.TEXT,
    proposalId: DataTypes.INTEGER,
  },
  { sequelize: database, modelName: "LineRevision", tableName: "line_revisions" },
);
