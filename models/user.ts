import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { storedBoolean } from "./stored-boolean";
import { database } from "./database";

/** A person with an account. Rows never leave `lib/users`: they hold the password hash. */
export class User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
  declare id: CreationOptional<number>;
  declare email: string;
  declare name: string;
  declare passwordHash: string;
  declare isAdministrator: CreationOptional<boolean>;
  declare active: CreationOptional<boolean>;
  declare sessionEpoch: CreationOptional<number>;
  declare preferences: CreationOptional<string>;
  declare createdAt: string;
}

User.init(
  {
    id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
    email: DataTypes.TEXT,
    name: DataTypes.TEXT,
    passwordHash: DataTypes.TEXT,
    isAdministrator: storedBoolean("isAdministrator"),
    active: storedBoolean("active"),
    sessionEpoch: DataTypes.INTEGER,
    preferences: DataTypes.TEXT,
    createdAt: DataTypes.TEXT,
  },
  { sequelize: database, modelName: "User", tableName: "users" },
);
