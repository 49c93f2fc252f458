import { performAct } from "@/lib/audit/perform-act";
import { reactivateUser } from "@/lib/users/reactivate-user";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { authorize } from "@/policies/authorize";
import type { DeactivateAccountInput } from "./schema";

/** Opens a closed account again, with the password it had. */
export function reactivateAccount(actor: Actor, input: DeactivateAccountInput, clock: Clock): Promise<void> {
  return performAct(actor, clock, { act: "reactivate_account", chain: HOUSE_CHAIN }, async (tx, record) => {
    authorize(actor, { on: "Installation", action: "create_account" });
    await reactivateUser(input, { tx, record });
  });
}
