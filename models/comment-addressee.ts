import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** A person to whom a remark is addressed. */
export class CommentAddressee extends Model<
  InferAttributes<CommentAddressee>,
  InferCreationAttributes<CommentAddressee>
> {
  declare id: CreationOptional<number>;
  declare commentId: number;
  declare userId: number;
}

CommentAddressee.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    commentId: DataTypes.INTEGER,
    userId: DataTypes.INTEGER,
  },
  { sequelize: database, modelName: "CommentAddressee", tableName: "comment_addressees" },
);
