import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** A member's no that moves nothing. */
export class Objection extends Model<InferAttributes<Objection>, InferCreationAttributes<Objection>> {
  declare id: CreationOptional<number>;
  declare proposalId: number;
  declare roundId: number;
  declare authorId: number;
  declare printedName: string;
  declare reason: string;
  declare raisedAt: string;
}

Objection.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    proposalId: DataTypes.INTEGER,
    roundId: DataTypes.INTEGER,
    authorId: DataTypes.INTEGER,
    printedName: DataTypes.TEXT,
    reason: DataTypes.TEXT,
    raisedAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Objection", tableName: "objections" },
);
