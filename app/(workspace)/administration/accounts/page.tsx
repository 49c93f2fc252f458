import type { Metadata } from "next";

import { PageHeading } from "@/app/_components/page-heading";
import { SectionHeading } from "@/app/_components/section-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { requireAdministrator } from "@/app/_server/administration-access";
import { listAccounts } from "@/lib/users/queries";

import { AccountsTable } from "./_components/accounts-table";
import { NewAccountForm } from "./_components/new-account-form";

export const metadata: Metadata = { title: "Accounts" };

export default async function AccountsPage() {
  const actor = await requireAdministrator();
  const accounts = await listAccounts();

  return (
    <>
      <PageHeading title="Accounts" subtitle="Who may sign in. An account is closed, never deleted." />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Sheet", value: "Administration, accounts" },
              { label: "Open", value: accounts.filter(({ active }) => active).length },
              { label: "Closed", value: accounts.filter(({ active }) => !active).length },
            ]}
          />
        }
      >
        <AccountsTable accounts={accounts} ownId={actor.userId} />
        <SectionHeading>Make an account</SectionHeading>
        <NewAccountForm />
      </Sheet>
    </>
  );
}
