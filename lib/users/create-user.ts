import type { Transaction } from "sequelize";
import type { RecordAct } from "@/lib/vocabulary/acts";
import { Refusal } from "@/lib/vocabulary/refusal";
import { User } from "@/models/user";
import { normalEmail, userByEmail } from "./queries";

export interface NewUser {
  email: string;
  name: string;
  /** From `hashPassword`, made before the transaction. */
  passwordHash: string;
  isAdministrator: boolean;
}

/** A step of the act that makes an account; the act has asked whether its actor may. */
export async function createUser(
  { email, name, passwordHash, isAdministrator }: NewUser,
  { tx, record, at }: { tx: Transaction; record: RecordAct; at: string },
): Promise<number> {
  const address = normalEmail(email);
  if (await userByEmail(address, tx)) {
    const sentence = "There is an account with this e-mail address already.";
    throw new Refusal("duplicate", sentence, [{ path: "email", sentence }]);
  }
  const user = await User.create(
    { email: address, name, passwordHash, isAdministrator, createdAt: at },
    { transaction: tx },
  );
  record({
    act: "create_account",
    subject: { type: "account", id: String(user.id), label: name },
    now: { email: address, name, isAdministrator },
  });
  return user.id;
}
