import { performAct } from "@/lib/audit/perform-act";
import { deactivateUser } from "@/lib/users/deactivate-user";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { authorize } from "@/policies/authorize";
import type { DeactivateAccountInput } from "./schema";

/** Closes an account: its sessions end at once, its name and signatures stay. */
export function deactivateAccount(actor: Actor, input: DeactivateAccountInput, clock: Clock): Promise<void> {
  return performAct(actor, clock, { act: "deactivate_account", chain: HOUSE_CHAIN }, async (tx, record) => {
    authorize(actor, { on: "Installation", action: "deactivate_account" });
    await deactivateUser(input, { tx, record });
  });
}
