import { performAct } from "@/lib/audit/perform-act";
import { createUser } from "@/lib/users/create-user";
import { hashPassword } from "@/lib/users/password";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { authorize, isAllowed } from "@/policies/authorize";
import type { CreateAccountInput } from "./schema";

/** Makes an account with its first password, which its owner changes. */
export async function createAccount(
  actor: Actor,
  { email, name, password, isAdministrator }: CreateAccountInput,
  clock: Clock,
): Promise<{ userId: number }> {
  const question = { on: "Installation", action: "create_account" } as const;
  // Hashing is slow, so that it is done before the transaction, and for nobody who would be refused.
  const passwordHash = isAllowed(actor, question) ? await hashPassword(password) : "";
  return performAct(actor, clock, { act: "create_account", chain: HOUSE_CHAIN }, async (tx, record, at) => {
    authorize(actor, question);
    const userId = await createUser({ email, name, passwordHash, isAdministrator }, { tx, record, at });
    return { userId };
  });
}
