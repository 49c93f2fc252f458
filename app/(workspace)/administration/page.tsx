import { redirect } from "next/navigation";

import { requireActor } from "@/app/_server/session";
import { isAllowed } from "@/policies/authorize";

export default async function AdministrationPage() {
  const actor = await requireActor();
  const mayReadAccounts = isAllowed(actor, { on: "Installation", action: "read_accounts" });

  redirect(mayReadAccounts ? "/administration/accounts" : "/administration/history");
}
