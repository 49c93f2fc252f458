import { performAct } from "@/lib/audit/perform-act";
import { countSignInAttempt, forgetSignInAttempts } from "@/lib/users/attempts";
import { checkCredentials } from "@/lib/users/check-credentials";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import type { Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import type { SignInInput } from "./schema";

export interface SignedIn {
  userId: number;
  printedName: string;
  sessionEpoch: number;
}

const NOBODY = { userId: null, printedName: "Nobody known" };

/**
 * Signs a person in; both outcomes stand in the house's history. What was typed as the address of nobody is not
 * written down: passwords get typed there too.
 */
export async function signIn({ email, password }: SignInInput, address: string, clock: Clock): Promise<SignedIn> {
  await countSignInAttempt(email, address);
  const { person, valid, sessionEpoch } = await checkCredentials(email, password);
  const subject = person
    ? { type: "account", id: String(person.userId), label: person.printedName }
    : { type: "account", id: "unknown", label: "An address that nobody has" };

  return performAct(person ?? NOBODY, clock, { act: "sign_in", chain: HOUSE_CHAIN, subject }, async (_tx, record) => {
    if (!person || !valid) throw new Refusal("wrong_password", "E-mail address or password is wrong.");
    record({ act: "sign_in", subject });
    await forgetSignInAttempts(email);
    return { ...person, sessionEpoch };
  });
}
