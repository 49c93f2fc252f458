import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import type { Role } from "@/lib/vocabulary/roles";
import { database } from "./database";

/** A role that a person holds in a product between two moments. */
export class Membership extends Model<InferAttributes<Membership>, InferCreationAttributes<Membership>> {
  declare id: CreationOptional<number>;
  declare userId: number;
  declare productId: number;
  declare role: Role;
  declare fromAt: string;
  declare untilAt: CreationOptional<string | null>;
}

Membership.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    userId: DataTypes.INTEGER,
    productId: DataTypes.INTEGER,
    role: DataTypes.TEXT,
    fromAt: DataTypes.TEXT,
    untilAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Membership", tableName: "memberships" },
);
