import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import type { SignatureSubject } from "@/lib/vocabulary/acts";
import type { Decision } from "@/lib/vocabulary/proposals";
import type { Capacity } from "@/lib/vocabulary/roles";
import { database } from "./database";

/** A signature on a round, an establishment or a baseline, with the text it stands under. */
export class Signature extends Model<InferAttributes<Signature>, InferCreationAttributes<Signature>> {
  declare id: CreationOptional<number>;
  declare productId: number;
  declare sequence: number;
  declare subjectType: SignatureSubject;
  declare roundId: CreationOptional<number | null>;
  declare baselineId: CreationOptional<number | null>;
  declare signerId: number;
  declare printedName: string;
  declare capacity: Capacity;
  declare deputyForId: CreationOptional<number | null>;
  declare deputyForName: CreationOptional<string | null>;
  declare decision: Decision;
  declare takesBackId: CreationOptional<number | null>;
  declare meaning: CreationOptional<string | null>;
  declare reason: CreationOptional<string | null>;
  declare canonicalText: string;
  declare hash: string;
  declare signedAt: string;
}

Signature.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    productId: DataTypes.INTEGER,
    sequence: DataTypes.INTEGER,
    subjectType: DataTypes.TEXT,
    roundId: DataTypes.INTEGER,
    baselineId: DataTypes.INTEGER,
    signerId: DataTypes.INTEGER,
    printedName: DataTypes.TEXT,
    capacity: DataTypes.TEXT,
    deputyForId: DataTypes.INTEGER,
    deputyForName: DataTypes.TEXT,
    decision: DataTypes.TEXT,
    takesBackId: DataTypes.INTEGER,
    meaning: DataTypes.TEXT,
    reason: DataTypes.TEXT,
    canonicalText: DataTypes.TEXT,
    hash: DataTypes.TEXT,
    signedAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Signature", tableName: "signatures" },
);
