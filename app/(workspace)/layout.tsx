import type { ReactNode } from "react";

import { requireActor } from "@/app/_server/session";
import { isAllowed } from "@/policies/authorize";

import { WorkspaceHeader } from "./_components/workspace-header";

export default async function WorkspaceLayout({ children }: { children: ReactNode }) {
  const actor = await requireActor();

  return (
    <>
      <a
        href="#matter"
        className="sr-only focus:not-sr-only focus:absolute focus:z-30 focus:bg-sheet focus:px-3 focus:py-2"
      >
        Go to the sheet
      </a>
      <WorkspaceHeader
        name={actor.printedName}
        showAccounts={isAllowed(actor, { on: "Installation", action: "read_accounts" })}
        showHouseHistory={isAllowed(actor, { on: "Installation", action: "read_house_history" })}
      />
      <main id="matter" tabIndex={-1} className="px-3 py-5 outline-none sm:px-7 sm:py-6 print:p-0">
        {children}
      </main>
    </>
  );
}
