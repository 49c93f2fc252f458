import { setPreferences } from "@/lib/users/preferences";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Preferences } from "@/lib/vocabulary/measures";
import { inTransaction } from "@/models/database";
import { authorize } from "@/policies/authorize";
import type { KeepPreferencesInput } from "./schema";

/**
 * Keeps how a person likes to read. No act of the history: it changes no number, no right and nothing that anybody
 * else sees, and an auditor, who changes nothing, reads in a measure too.
 */
export function keepPreferences(actor: Actor, change: KeepPreferencesInput): Promise<Preferences> {
  return inTransaction(async (tx) => {
    authorize(actor, { on: "Account", action: "keep_preferences", userId: actor.userId });
    return setPreferences(actor.userId, change, tx);
  });
}
