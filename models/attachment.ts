import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** A file beside a record; voided, never deleted. */
export class Attachment extends Model<InferAttributes<Attachment>, InferCreationAttributes<Attachment>> {
  declare id: CreationOptional<number>;
  declare productId: number;
  /** In a working copy until a round cites it, or beside a submitted proposal. */
  declare ownerType: "working_copy" | "proposal";
  declare ownerId: number;
  declare name: string;
  declare mediaType: string;
  declare size: number;
  declare sha256: string;
  declare sourceDate: string;
  declare addedById: number;
  declare addedAt: string;
  declare voidedById: CreationOptional<number | null>;
  declare voidedAt: CreationOptional<string | null>;
  declare voidReason: CreationOptional<string | null>;
}

Attachment.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    productId: DataTypes.INTEGER,
    ownerType: DataTypes.TEXT,
    ownerId: DataTypes.INTEGER,
    name: DataTypes.TEXT,
    mediaType: DataTypes.TEXT,
    size: DataTypes.INTEGER,
    sha256: DataTypes.TEXT,
    sourceDate: DataTypes.TEXT,
    addedById: DataTypes.INTEGER,
    addedAt: DataTypes.TEXT,
    voidedById: DataTypes.INTEGER,
    voidedAt: DataTypes.TEXT,
    voidReason: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Attachment", tableName: "attachments" },
);
