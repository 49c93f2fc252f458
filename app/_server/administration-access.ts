import { forbidden } from "next/navigation";

import type { Actor } from "@/lib/vocabulary/actor";
import { isAllowed } from "@/policies/authorize";

import { requireActor } from "./session";

/** The signed-in administrator; others are told that their roles do not reach here. */
export async function requireAdministrator(): Promise<Actor> {
  const actor = await requireActor();
  if (!isAllowed(actor, { on: "Installation", action: "read_accounts" })) forbidden();

  return actor;
}
