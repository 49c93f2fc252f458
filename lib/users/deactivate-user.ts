import type { Transaction } from "sequelize";
import type { RecordAct } from "@/lib/vocabulary/acts";
import { Refusal } from "@/lib/vocabulary/refusal";
import { User } from "@/models/user";
import { raiseSessionEpoch } from "./session-epoch";

/** A step of the act that closes an account: its sessions end, its name stays in the history. */
export async function deactivateUser(
  { userId, reason }: { userId: number; reason: string },
  { tx, record }: { tx: Transaction; record: RecordAct },
): Promise<void> {
  const user = await User.findByPk(userId, { transaction: tx });
  if (!user) throw new Refusal("not_found", "This account does not exist.");
  if (!user.active) throw new Refusal("wrong_state", "This account is closed already.");
  if (user.isAdministrator && (await openAdministrators(tx)) < 2) {
    throw new Refusal("wrong_state", "This is the only administrator: nobody could open an account again.");
  }
  await user.update({ active: false }, { transaction: tx });
  await raiseSessionEpoch(userId, tx);
  record({
    act: "deactivate_account",
    subject: { type: "account", id: String(userId), label: user.name },
    was: { active: true },
    now: { active: false },
    reason,
  });
}

function openAdministrators(tx: Transaction): Promise<number> {
  return User.count({ where: { isAdministrator: true, active: true }, transaction: tx });
}
