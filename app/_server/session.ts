import { headers } from "next/headers";
import { redirect } from "next/navigation";
import { getServerSession } from "next-auth";
import { cache } from "react";

import { actorById } from "@/lib/users/queries";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock } from "@/lib/vocabulary/clock";

import { authOptions } from "./auth-options";

/** Who is signed in, with the roles in force now; loaded once for each request. */
export const currentActor = cache(async (): Promise<Actor | null> => {
  const session = await getServerSession(authOptions);
  if (!session) return null;
  const account = await actorById(session.userId, systemClock().toISOString());

  return account?.sessionEpoch === session.epoch ? account.actor : null;
});

/** The signed-in person, or on to the sign-in page, which leads back here. */
export async function requireActor(): Promise<Actor> {
  const actor = await currentActor();
  if (actor) return actor;

  const here = (await headers()).get("x-path");
  redirect(here ? `/sign-in?to=${encodeURIComponent(here)}` : "/sign-in");
}
