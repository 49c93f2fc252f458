import { Refusal } from "@/lib/vocabulary/refusal";
import { demandPassword } from "./demand-password";

/**
 * What is wrong with a signer's password, or null. Hashing takes its time, so this runs before the transaction; the
 * command refuses with it only after it has asked whether the person may sign at all.
 */
export async function passwordRefusal(userId: number, password: string): Promise<Refusal | null> {
  try {
    await demandPassword(userId, password);
    return null;
  } catch (problem) {
    if (problem instanceof Refusal) return problem;
    throw problem;
  }
}
