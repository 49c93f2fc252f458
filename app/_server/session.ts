import { headers } from "next/headers";
import { redirect } from "next/navigation";
import { getServerSession } from "next-auth";
import { cache } from "react";

import { type ActiveAccount, actorById } from "@/lib/users/queries";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock } from "@/lib/vocabulary/clock";
import { FIRST_PREFERENCES, type Preferences } from "@/lib/vocabulary/measures";

import { authOptions } from "./auth-options";

/** The account that is signed in, with the roles in force now; loaded once for each request. */
const currentAccount = cache(async (): Promise<ActiveAccount | null> => {
  const session = await getServerSession(authOptions);
  if (!session) return null;
  const account = await actorById(session.userId, systemClock().toISOString());

  return account?.sessionEpoch === session.epoch ? account : null;
});

/** Who is signed in. */
export async function currentActor(): Promise<Actor | null> {
  return (await currentAccount())?.actor ?? null;
}

/** How the signed-in person likes to read. */
export async function currentPreferences(): Promise<Preferences> {
  return (await currentAccount())?.preferences ?? FIRST_PREFERENCES;
}

/** The signed-in person, or on to the sign-in page, which leads back here. */
export async function requireActor(): Promise<Actor> {
  const actor = await currentActor();
  if (actor) return actor;

  const here = (await headers()).get("x-path");
  redirect(here ? `/sign-in?to=${encodeURIComponent(here)}` : "/sign-in");
}
