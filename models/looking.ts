import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** What a person opened, first and last. */
export class Looking extends Model<InferAttributes<Looking>, InferCreationAttributes<Looking>> {
  declare id: CreationOptional<number>;
  declare userId: number;
  declare kind: string;
  declare subject: string;
  declare firstAt: string;
  declare lastAt: string;
}

Looking.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    userId: DataTypes.INTEGER,
    kind: DataTypes.TEXT,
    subject: DataTypes.TEXT,
    firstAt: DataTypes.TEXT,
    lastAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Looking", tableName: "lookings" },
);
