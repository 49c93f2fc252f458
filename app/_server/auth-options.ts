import type { AuthOptions, User } from "next-auth";
import type { JWT } from "next-auth/jwt";
import Credentials from "next-auth/providers/credentials";

import { SignInInput } from "@/lib/accounts/schema";
import { signIn } from "@/lib/accounts/sign-in";
import { signOut } from "@/lib/accounts/sign-out";
import { actorById } from "@/lib/users/queries";
import { systemClock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";

/** A working day; who comes back tomorrow signs in again. */
const LONGEST_SESSION = 14 * 60 * 60;

const secure = (process.env.NEXTAUTH_URL ?? "").startsWith("https://");

export const authOptions: AuthOptions = {
  session: { strategy: "jwt", maxAge: LONGEST_SESSION },
  pages: { signIn: "/sign-in", error: "/sign-in", signOut: "/sign-in" },
  providers: [
    Credentials({
      credentials: { email: {}, password: {} },
      authorize: (credentials, request) => authorizeCredentials(credentials, addressOf(request.headers)),
    }),
  ],
  cookies: {
    sessionToken: {
      name: secure ? "__Host-leeboard" : "leeboard",
      // Lax, not strict: a link in a mail has to find its reader signed in. Writes from other sites are refused anyway.
      options: { httpOnly: true, sameSite: "lax", path: "/", secure },
    },
  },
  callbacks: {
    jwt: ({ token, user }) => (user ? { userId: Number(user.id), epoch: user.epoch } : livingToken(token)),
    // An empty session is no session: this is how one ends that was signed out elsewhere.
    session: ({ session, token: { userId, epoch } }) =>
      userId === undefined || epoch === undefined ? NO_SESSION : { expires: session.expires, userId, epoch },
  },
  events: { signOut: ({ token }) => endSession(token) },
};

const NO_SESSION = {} as { expires: string; userId: number; epoch: number };

/** Checks what was typed. Throws a code where attempts have run out, answers null where the two don't belong together. */
export async function authorizeCredentials(credentials: unknown, address: string): Promise<User | null> {
  const { email, password } = Object(credentials);
  const input = SignInInput.safeParse({ email, password });
  if (!input.success) return null;

  try {
    const { userId, sessionEpoch } = await signIn(input.data, address, systemClock);
    return { id: String(userId), epoch: sessionEpoch };
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    if (error.code === "too_many_attempts") throw new Error(error.code);
    return null;
  }
}

/** The token while its account is open and no sign-out came since; without a person otherwise. */
export async function livingToken(token: JWT): Promise<JWT> {
  const { userId, epoch } = token;
  if (userId === undefined) return {};
  const account = await actorById(userId, systemClock().toISOString());

  return account && account.sessionEpoch === epoch ? { userId, epoch } : {};
}

/** Raises the account's epoch, so that a copy of the cookie is worth nothing. */
async function endSession(token: JWT): Promise<void> {
  const { userId } = await livingToken(token);
  if (userId === undefined) return;
  const account = await actorById(userId, systemClock().toISOString());
  if (account) await signOut(account.actor, systemClock);
}

/** The sender's address as the server saw it. A client can make it up: attempts are counted by account first. */
function addressOf(headers: Record<string, unknown> | undefined): string {
  const forwarded = headers?.["x-forwarded-for"];

  return typeof forwarded === "string" ? (forwarded.split(",").at(-1)?.trim() ?? "unknown") : "unknown";
}
