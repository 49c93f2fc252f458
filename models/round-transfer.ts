import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** One transfer as it was submitted. */
export class RoundTransfer extends Model<InferAttributes<RoundTransfer>, InferCreationAttributes<RoundTransfer>> {
  declare id: CreationOptional<number>;
  declare roundId: number;
  declare position: number;
  declare body: string;
}

RoundTransfer.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    roundId: DataTypes.INTEGER,
    position: DataTypes.INTEGER,
    body: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "RoundTransfer", tableName: "round_transfers" },
);
