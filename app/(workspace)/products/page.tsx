import type { Metadata } from "next";

import { ButtonLink } from "@/app/_components/button";
import { EmptyNote } from "@/app/_components/empty-note";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { dayText } from "@/app/_components/utc-text";
import { requireActor } from "@/app/_server/session";
import { registerFor } from "@/lib/products/queries";
import { systemClock } from "@/lib/vocabulary/clock";
import { isAllowed } from "@/policies/authorize";

import { RegisterTable } from "./_components/register-table";

export const metadata: Metadata = { title: "Products" };

export default async function ProductsPage() {
  const actor = await requireActor();
  const entries = await registerFor(actor);
  const mayCreate = isAllowed(actor, { on: "Installation", action: "create_product" });

  return (
    <div className="mx-auto max-w-[92rem]">
      <PageHeading
        title="Products"
        subtitle="Every product in which you hold a role, at the operating point where it stands worst"
        actions={mayCreate ? <ButtonLink href="/administration/products">Make a product…</ButtonLink> : null}
      />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Sheet", value: "Register of products" },
              { label: "Products", value: entries.length },
              { label: "Date", value: dayText(systemClock().toISOString()) },
            ]}
          />
        }
      >
        {entries.length > 0 ? (
          <RegisterTable entries={entries} />
        ) : (
          <EmptyNote title="No product yet.">
            {mayCreate
              ? "Make the first product under Administration, then give it a program manager, who establishes it."
              : "You hold no role in a product yet. The administrator of the installation gives roles."}
          </EmptyNote>
        )}
      </Sheet>
    </div>
  );
}
