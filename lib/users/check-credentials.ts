import { User } from "@/models/user";
import { spendPasswordCheck, verifyPassword } from "./password";

export interface CheckedCredentials {
  /** Who has this address, whether or not the password fits; null when nobody has. */
  person: { userId: number; printedName: string } | null;
  /** Password right and account open. */
  valid: boolean;
  sessionEpoch: number;
}

/** Takes as long for an address that nobody has and for a closed account as for a wrong password. */
export async function checkCredentials(email: string, password: string): Promise<CheckedCredentials> {
  const user = await User.findOne({ where: { email } });
  if (!user) {
    await spendPasswordCheck(password);
    return { person: null, valid: false, sessionEpoch: 0 };
  }
  const fits = await verifyPassword(password, user.passwordHash);
  return {
    person: { userId: user.id, printedName: user.name },
    valid: fits && user.active,
    sessionEpoch: user.sessionEpoch,
  };
}
