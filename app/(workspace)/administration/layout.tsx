import { forbidden } from "next/navigation";
import type { ReactNode } from "react";

import { IndexLayout } from "@/app/_components/index-layout";
import { SheetIndex } from "@/app/_components/sheet-index";
import { requireActor } from "@/app/_server/session";
import { isAllowed } from "@/policies/authorize";

export default async function AdministrationLayout({ children }: { children: ReactNode }) {
  const actor = await requireActor();
  if (!isAllowed(actor, { on: "Installation", action: "read_accounts" })) forbidden();

  return (
    <IndexLayout
      index={
        <SheetIndex
          label="Sheets of the administration"
          entries={[
            { href: "/administration/accounts", label: "Accounts" },
            { href: "/administration/products", label: "Products" },
            { href: "/administration/roles", label: "Roles" },
          ]}
        />
      }
    >
      {children}
    </IndexLayout>
  );
}
