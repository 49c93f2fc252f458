import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** A sign-in that lasts until it is ended. */
export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare id: string;
  declare userId: number;
  declare startedAt: string;
  declare endedAt: CreationOptional<string | null>;
}

Session.init(
  {
    id: { type: DataTypes.TEXT, primaryKey: true },
    userId: DataTypes.INTEGER,
    startedAt: DataTypes.TEXT,
    endedAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Session", tableName: "sessions" },
);
