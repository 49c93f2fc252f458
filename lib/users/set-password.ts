import type { Transaction } from "sequelize";
import { User } from "@/models/user";
import { raiseSessionEpoch } from "./session-epoch";

/** Stores a new hash and ends every session made under the old password; answers the new epoch. */
export async function setPassword(userId: number, passwordHash: string, tx: Transaction): Promise<number> {
  const user = await User.findByPk(userId, { transaction: tx, rejectOnEmpty: true });
  await user.update({ passwordHash }, { transaction: tx });
  return raiseSessionEpoch(userId, tx);
}
