import type { Transaction } from "sequelize";
import { User } from "@/models/user";

/** Ends every session of the person: each carries the epoch under which it was made. Answers the new one. */
export async function raiseSessionEpoch(userId: number, tx: Transaction): Promise<number> {
  const user = await User.findByPk(userId, { transaction: tx, rejectOnEmpty: true });
  await user.update({ sessionEpoch: user.sessionEpoch + 1 }, { transaction: tx });
  return user.sessionEpoch;
}
