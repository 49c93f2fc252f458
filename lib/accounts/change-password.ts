import { performAct } from "@/lib/audit/perform-act";
import { demandPassword } from "@/lib/users/demand-password";
import { hashPassword } from "@/lib/users/password";
import { setPassword } from "@/lib/users/set-password";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import type { ChangePasswordInput } from "./schema";

/** Changes one's own password and ends every session made under the old one; answers the new epoch. */
export async function changePassword(
  actor: Actor,
  { current, next }: ChangePasswordInput,
  clock: Clock,
): Promise<{ sessionEpoch: number }> {
  const refusal = await wrongPassword(actor, current);
  const passwordHash = refusal ? "" : await hashPassword(next);
  const subject = { type: "account", id: String(actor.userId), label: actor.printedName };

  return performAct(actor, clock, { act: "change_password", chain: HOUSE_CHAIN, subject }, async (tx, record) => {
    if (refusal) throw refusal;
    const sessionEpoch = await setPassword(actor.userId, passwordHash, tx);
    record({ act: "change_password", subject });
    return { sessionEpoch };
  });
}

/** Hash work is done before the transaction; its refusal is thrown inside, where refusals are written down. */
async function wrongPassword(actor: Actor, current: string): Promise<Refusal | null> {
  try {
    await demandPassword(actor.userId, current, "current");
    return null;
  } catch (problem) {
    if (problem instanceof Refusal) return problem;
    throw problem;
  }
}
