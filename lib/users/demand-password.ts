import { Refusal } from "@/lib/vocabulary/refusal";
import { User } from "@/models/user";
import { countPasswordAttempt, forgetPasswordAttempts } from "./attempts";
import { verifyPassword } from "./password";

/**
 * The password of a signed-in person, typed again before a signature. Refused with `wrong_password` at the given field.
 * Slow on purpose: call it before the transaction, never inside.
 */
export async function demandPassword(userId: number, password: string, path = "password"): Promise<void> {
  await countPasswordAttempt(userId);
  const user = await User.findByPk(userId);
  if (!user || !user.active || !(await verifyPassword(password, user.passwordHash))) {
    const sentence = "This is not your password.";
    throw new Refusal("wrong_password", sentence, [{ path, sentence }]);
  }
  await forgetPasswordAttempts(userId);
}
