import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { storedBoolean } from "./stored-boolean";
import { database } from "./database";

/** A remark (numbered) or an answer to one; only the settlement is ever filled in later. */
export class Comment extends Model<InferAttributes<Comment>, InferCreationAttributes<Comment>> {
  declare id: CreationOptional<number>;
  declare proposalId: number;
  declare roundId: CreationOptional<number | null>;
  declare number: CreationOptional<number | null>;
  declare parentId: CreationOptional<number | null>;
  declare lineId: CreationOptional<number | null>;
  declare field: CreationOptional<string | null>;
  declare authorId: number;
  declare printedName: string;
  declare body: string;
  declare suggestion: CreationOptional<string | null>;
  declare asksAction: CreationOptional<boolean>;
  declare writtenAt: string;
  declare settledById: CreationOptional<number | null>;
  declare settledByName: CreationOptional<string | null>;
  declare settledAt: CreationOptional<string | null>;
  declare settledReason: CreationOptional<string | null>;
}

Comment.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    proposalId: DataTypes.INTEGER,
    roundId: DataTypes.INTEGER,
    number: DataTypes.INTEGER,
    parentId: DataTypes.INTEGER,
    lineId: DataTypes.INTEGER,
    field: DataTypes.TEXT,
    authorId: DataTypes.INTEGER,
    printedName: DataTypes.TEXT,
    body: DataTypes.TEXT,
    suggestion: DataTypes.TEXT,
    asksAction: storedBoolean("asksAction"),
    writtenAt: DataTypes.TEXT,
    settledById: DataTypes.INTEGER,
    settledByName: DataTypes.TEXT,
    settledAt: DataTypes.TEXT,
    settledReason: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Comment", tableName: "comments" },
);
