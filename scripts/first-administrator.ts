import { performAct } from "@/lib/audit/perform-act";
import { createUser } from "@/lib/users/create-user";
import { hashPassword } from "@/lib/users/password";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import type { Clock } from "@/lib/vocabulary/clock";

export interface FirstAdministrator {
  email: string;
  name: string;
  password: string;
}

/** The one account that nobody could have made: the installation makes it, and its history begins with that. */
export async function createFirstAdministrator(
  clock: Clock,
  { email, name, password }: FirstAdministrator,
): Promise<number> {
  const passwordHash = await hashPassword(password);
  const installation = { userId: null, printedName: "Installation" };
  return performAct(installation, clock, { act: "create_account", chain: HOUSE_CHAIN }, (tx, record, at) =>
    createUser({ email, name, passwordHash, isAdministrator: true }, { tx, record, at }),
  );
}
