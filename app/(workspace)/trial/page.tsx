import type { Metadata } from "next";

import { requireActor } from "@/app/_server/session";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { registerFor } from "@/lib/products/queries";
import { isAllowed } from "@/policies/authorize";

import { TrialSheet } from "./_components/trial-sheet";

export const metadata: Metadata = { title: "Trial" };

export default async function TrialPage() {
  const actor = await requireActor();
  const products = (await registerFor(actor))
    .map(({ product }) => product)
    .filter(({ id, newestIssue }) => {
      return newestIssue !== null && isAllowed(actor, { on: "Product", action: "start_draft", productId: id });
    })
    .map(({ code, name }) => ({ code, name }));

  return (
    <>
      <PageHeading
        title="Trial"
        subtitle="Try values with every method, two settings beside each other. Nothing is saved but in this browser tab."
      />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Sheet", value: "Trial of two settings" },
              { label: "Typed by", value: actor.printedName },
              { label: "Standing", value: "no record" },
            ]}
          />
        }
      >
        <TrialSheet userId={actor.userId} products={products} />
      </Sheet>
    </>
  );
}
