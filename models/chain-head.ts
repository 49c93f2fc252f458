import { DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** Where a chain ends; a trigger moves it with each entry. */
export class ChainHead extends Model<InferAttributes<ChainHead>, InferCreationAttributes<ChainHead>> {
  declare chain: string;
  declare sequence: number;
  declare hash: string;
}

ChainHead.init(
  {
    chain: { type: DataTypes.TEXT, primaryKey: true },
    sequence: DataTypes.INTEGER,
    hash: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "ChainHead", tableName: "chain_heads" },
);
