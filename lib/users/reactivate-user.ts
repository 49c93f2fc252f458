import type { Transaction } from "sequelize";
import type { RecordAct } from "@/lib/vocabulary/acts";
import { Refusal } from "@/lib/vocabulary/refusal";
import { User } from "@/models/user";

/** A step of the act that opens a closed account again. */
export async function reactivateUser(
  { userId, reason }: { userId: number; reason: string },
  { tx, record }: { tx: Transaction; record: RecordAct },
): Promise<void> {
  const user = await User.findByPk(userId, { transaction: tx });
  if (!user) throw new Refusal("not_found", "This account does not exist.");
  if (user.active) throw new Refusal("wrong_state", "This account is open.");
  await user.update({ active: true }, { transaction: tx });
  record({
    act: "reactivate_account",
    subject: { type: "account", id: String(userId), label: user.name },
    was: { active: false },
    now: { active: true },
    reason,
  });
}
