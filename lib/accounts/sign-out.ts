import { performAct } from "@/lib/audit/perform-act";
import { raiseSessionEpoch } from "@/lib/users/session-epoch";
import { HOUSE_CHAIN, type Act } from "@/lib/vocabulary/acts";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";

/** Signing out makes the cookie worthless too, and with it every other session of the person. */
export function signOut(actor: Actor, clock: Clock): Promise<void> {
  return endAll(actor, clock, "sign_out");
}

/** "Sign out everywhere" on the account page. */
export function endSessions(actor: Actor, clock: Clock): Promise<void> {
  return endAll(actor, clock, "end_sessions");
}

function endAll(actor: Actor, clock: Clock, act: Extract<Act, "sign_out" | "end_sessions">): Promise<void> {
  const subject = { type: "account", id: String(actor.userId), label: actor.printedName };
  return performAct(actor, clock, { act, chain: HOUSE_CHAIN, subject }, async (tx, record) => {
    await raiseSessionEpoch(actor.userId, tx);
    record({ act, subject });
  });
}
