import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { database } from "./database";

/** A Monte Carlo run of an issue at one of its operating points: what was drawn from, how, and what came out. */
export class MonteCarloRun extends Model<InferAttributes<MonteCarloRun>, InferCreationAttributes<MonteCarloRun>> {
  declare id: CreationOptional<number>;
  declare productId: number;
  declare issue: number;
  declare operatingPointId: number;
  declare seed: number;
  declare draws: number;
  declare recipe: string;
  declare inputHash: string;
  declare result: string;
  declare resultHash: string;
  declare askedById: number;
  declare printedName: string;
  declare ranAt: string;
}

MonteCarloRun.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    productId: DataTypes.INTEGER,
    issue: DataTypes.INTEGER,
    operatingPointId: DataTypes.INTEGER,
    seed: DataTypes.INTEGER,
    draws: DataTypes.INTEGER,
    recipe: DataTypes.TEXT,
    inputHash: DataTypes.TEXT,
    result: DataTypes.TEXT,
    resultHash: DataTypes.TEXT,
    askedById: DataTypes.INTEGER,
    printedName: DataTypes.TEXT,
    ranAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "MonteCarloRun", tableName: "monte_carlo_runs" },
);
