import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** A mail that is to leave after the commit. */
export class OutboxMessage extends Model<InferAttributes<OutboxMessage>, InferCreationAttributes<OutboxMessage>> {
  declare id: CreationOptional<number>;
  declare key: string;
  declare toUserId: number;
  declare template: string;
  declare data: string;
  declare messageId: string;
  declare entryId: CreationOptional<number | null>;
  declare createdAt: string;
  declare attempts: CreationOptional<number>;
  declare nextAttemptAt: string;
  declare leasedUntil: CreationOptional<string | null>;
  declare sentAt: CreationOptional<string | null>;
  declare failedAt: CreationOptional<string | null>;
  declare lastProblem: CreationOptional<string | null>;
}

OutboxMessage.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    key: DataTypes.TEXT,
    toUserId: DataTypes.INTEGER,
    template: DataTypes.TEXT,
    data: DataTypes.TEXT,
    messageId: DataTypes.TEXT,
    entryId: DataTypes.INTEGER,
    createdAt: DataTypes.TEXT,
    attempts: DataTypes.INTEGER,
    nextAttemptAt: DataTypes.TEXT,
    leasedUntil: DataTypes.TEXT,
    sentAt: DataTypes.TEXT,
    failedAt: DataTypes.TEXT,
    lastProblem: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "OutboxMessage", tableName: "outbox_messages" },
);
