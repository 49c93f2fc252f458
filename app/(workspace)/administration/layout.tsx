import { forbidden } from "next/navigation";
import type { ReactNode } from "react";

import { IndexLayout } from "@/app/_components/index-layout";
import { SheetIndex } from "@/app/_components/sheet-index";
import { requireActor } from "@/app/_server/session";
import { isAllowed } from "@/policies/authorize";

const ACCOUNTS_AND_ROLES = [
  { href: "/administration/accounts", label: "Accounts" },
  { href: "/administration/products", label: "Products" },
  { href: "/administration/roles", label: "Roles" },
];

export default async function AdministrationLayout({ children }: { children: ReactNode }) {
  const actor = await requireActor();
  const entries = [
    ...(isAllowed(actor, { on: "Installation", action: "read_accounts" }) ? ACCOUNTS_AND_ROLES : []),
    ...(isAllowed(actor, { on: "Installation", action: "read_house_history" })
      ? [{ href: "/administration/history", label: "History" }]
      : []),
  ];
  if (entries.length === 0) forbidden();

  return (
    <IndexLayout index={<SheetIndex label="Sheets of the administration" entries={entries} />}>{children}</IndexLayout>
  );
}
