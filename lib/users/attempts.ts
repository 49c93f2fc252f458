import { RateLimiterMemory, RateLimiterRes } from "rate-limiter-flexible";
import { Refusal } from "@/lib/vocabulary/refusal";

interface Limits {
  byEmail: RateLimiterMemory;
  byAddress: RateLimiterMemory;
  byPerson: RateLimiterMemory;
}

declare global {
  // One count per process, though the module is loaded once per bundle.
  var __leeboardAttempts: Limits | undefined;
}

export const ATTEMPTS_BY_EMAIL = 10;
export const ATTEMPTS_BY_ADDRESS = 60;
export const ATTEMPTS_BY_PERSON = 10;
const WINDOW_SECONDS = 15 * 60;

function limits(): Limits {
  globalThis.__leeboardAttempts ??= {
    byEmail: new RateLimiterMemory({ points: ATTEMPTS_BY_EMAIL, duration: WINDOW_SECONDS }),
    byAddress: new RateLimiterMemory({ points: ATTEMPTS_BY_ADDRESS, duration: WINDOW_SECONDS }),
    byPerson: new RateLimiterMemory({ points: ATTEMPTS_BY_PERSON, duration: WINDOW_SECONDS }),
  };
  return globalThis.__leeboardAttempts;
}

/** Counts one attempt to sign in, by account first and by network address too, which its sender may have made up. */
export async function countSignInAttempt(email: string, address: string): Promise<void> {
  await take(limits().byEmail, email);
  await take(limits().byAddress, address);
}

/** A sign-in that succeeded gives its account's attempts back. */
export async function forgetSignInAttempts(email: string): Promise<void> {
  await limits().byEmail.delete(email);
}

/** Counts one password typed by a person who is signed in. */
export async function countPasswordAttempt(userId: number): Promise<void> {
  await take(limits().byPerson, String(userId));
}

export async function forgetPasswordAttempts(userId: number): Promise<void> {
  await limits().byPerson.delete(String(userId));
}

async function take(limiter: RateLimiterMemory, key: string): Promise<void> {
  try {
    await limiter.consume(key);
  } catch (rejection) {
    // The package rejects with a result, which is no Error.
    if (!(rejection instanceof RateLimiterRes)) throw rejection;
    const minutes = Math.max(1, Math.ceil(rejection.msBeforeNext / 60_000));
    throw new Refusal("too_many_attempts", `Too many attempts. Try again in ${minutes} min.`);
  }
}
