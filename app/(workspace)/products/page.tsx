import type { Metadata } from "next";

import { ButtonLink } from "@/app/_components/button";
import { EmptyNote } from "@/app/_components/empty-note";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { dayText } from "@/app/_components/utc-text";
import { chosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { MeasureBar } from "@/app/(workspace)/_measures/measure-bar";
import { currentPreferences, requireActor } from "@/app/_server/session";
import { NEWTONS } from "@/lib/evaluation/measures/reading";
import { registerSheet } from "@/lib/products/register-sheet";
import { waitingByProduct } from "@/lib/proposals/day-sheet/waiting-by-product";
import { systemClock } from "@/lib/vocabulary/clock";
import { isAllowed } from "@/policies/authorize";

import { RegisterFilter } from "./_components/register-filter";
import { RegisterTable } from "./_components/register-table";
import { chosenProducts, registerAddress, RegisterQuery, type RegisterRow } from "./_register/register-rows";

export const metadata: Metadata = { title: "Products" };

export default async function ProductsPage({ searchParams }: PageProps<"/products">) {
  const query = RegisterQuery.parse(await searchParams);
  const actor = await requireActor();
  const [sheet, waiting] = await Promise.all([registerSheet(actor), waitingByProduct(actor)]);
  const entries = sheet.map((entry) => ({ ...entry, waiting: waiting.get(entry.product.code) ?? 0 }));
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
          <Register entries={entries} query={query} />
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

async function Register({ entries, query }: { entries: readonly RegisterRow[]; query: RegisterQuery }) {
  const bases = entries.flatMap(({ trend }) => trend.at(-1)?.basis ?? []);
  const measure = chosenMeasure(query.measure, await currentPreferences(), bases);
  const rows = chosenProducts(entries, query);

  return (
    <>
      <RegisterFilter query={query} found={rows.length} all={entries.length} />
      <MeasureBar
        chosen={measure}
        reading={measure.measure === "newtons" && bases[0] ? readingFor(measure, bases[0]) : NEWTONS}
        hrefOf={(next) => registerAddress(query, { measure: next })}
      />
      {rows.length === 0 ? (
        <EmptyNote title="No product is like that.">Ask for fewer words, or show all products again.</EmptyNote>
      ) : (
        <RegisterTable rows={rows} query={query} measure={measure} />
      )}
    </>
  );
}
