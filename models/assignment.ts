import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import type { Capacity } from "@/lib/vocabulary/roles";
import { database } from "./database";

/** The one person named to sign in a capacity. */
export class Assignment extends Model<InferAttributes<Assignment>, InferCreationAttributes<Assignment>> {
  declare id: CreationOptional<number>;
  declare proposalId: number;
  declare capacity: Capacity;
  declare userId: number;
  declare namedById: number;
  declare namedAt: string;
  declare endedAt: CreationOptional<string | null>;
  /** Why this person was named in another's place; null where nobody had been named. */
  declare reason: CreationOptional<string | null>;
}

Assignment.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    proposalId: DataTypes.INTEGER,
    capacity: DataTypes.TEXT,
    userId: DataTypes.INTEGER,
    namedById: DataTypes.INTEGER,
    namedAt: DataTypes.TEXT,
    endedAt: DataTypes.TEXT,
    reason: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "Assignment", tableName: "assignments" },
);
