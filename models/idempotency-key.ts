import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** What a form answered when it was first sent. */
export class IdempotencyKey extends Model<InferAttributes<IdempotencyKey>, InferCreationAttributes<IdempotencyKey>> {
  declare id: CreationOptional<number>;
  declare userId: number;
  declare act: string;
  declare key: string;
  declare result: string;
  declare madeAt: string;
}

IdempotencyKey.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    userId: DataTypes.INTEGER,
    act: DataTypes.TEXT,
    key: DataTypes.TEXT,
    result: DataTypes.TEXT,
    madeAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "IdempotencyKey", tableName: "idempotency_keys" },
);
