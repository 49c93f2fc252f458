import type { Metadata, Route } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";

import { currentPreferences, requireActor } from "@/app/_server/session";
import { PageHeading } from "@/app/_components/page-heading";
import { SectionHeading } from "@/app/_components/section-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { lineHistory } from "@/lib/budget/line-history";
import { findLine } from "@/lib/evaluation/budget/indexed-state";
import { itemsOfFinish } from "@/lib/evaluation/budget/touches";
import { fieldRows } from "@/lib/evaluation/lines/field-rows";
import { nameBookOf } from "@/lib/evaluation/lines/name-book";

import { AsStoodBanner } from "@/app/(workspace)/products/[productCode]/_components/as-stood-banner";
import { FieldTable } from "@/app/(workspace)/products/[productCode]/_components/field-table";
import { RevisionsTable } from "@/app/(workspace)/products/[productCode]/_components/revisions-table";
import { budgetFields } from "@/app/(workspace)/products/[productCode]/_components/sheet-fields";
import { pageBudget, readForPage } from "@/app/(workspace)/products/[productCode]/_server/read-page";
import { SheetQuery } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-filter";
import { FinishItems } from "./_components/finish-items";

type Props = PageProps<"/products/[productCode]/catalogue/[finishNumber]">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { productCode, finishNumber } = await params;
  return { title: `Finish ${finishNumber} of ${productCode}` };
}

export default async function FinishPage({ params, searchParams }: Props) {
  const { productCode, finishNumber } = await params;
  const query = SheetQuery.parse(await searchParams);
  const [actor, { units }, budget] = await Promise.all([
    requireActor(),
    currentPreferences(),
    pageBudget(productCode, query),
  ]);
  const line = budget ? findLine(budget.state, "finish", finishNumber) : undefined;
  if (!budget || line?.kind !== "finish") notFound();

  const revisions = await readForPage(() => lineHistory(actor, productCode, "finish", finishNumber));
  const until = revisions.filter(({ issue }) => issue.number <= budget.issue.number);
  const items = itemsOfFinish(budget.state.lines, finishNumber);
  const base = `/products/${budget.product.code}`;

  return (
    <>
      <PageHeading
        title={`${finishNumber} ${line.body.name}`}
        subtitle={`${budget.product.code} · issue ${budget.issue.number} · finish${line.retired ? ", retired" : ""}`}
      />
      <Sheet titleBlock={<TitleBlock fields={budgetFields(budget, null)} />}>
        <AsStoodBanner budget={budget} newestHref={`${base}/catalogue/${finishNumber}`} />
        <SectionHeading aside={`revision ${line.letter}`}>Finish</SectionHeading>
        <FieldTable
          rows={fieldRows(line, nameBookOf(budget.state, new Map()))}
          caption={`Finish ${finishNumber}`}
          units={units}
        />
        <SectionHeading aside={items.length === 1 ? "1 item" : `${items.length} items`}>
          Items that have it
        </SectionHeading>
        <FinishItems budget={budget} items={items} units={units} />
        <SectionHeading>Revisions</SectionHeading>
        <RevisionsTable revisions={until} productCode={budget.product.code} />
        <p className="mt-4 text-sm print:hidden">
          <Link className="link" href={`${base}/catalogue` as Route}>
            All finishes and methods
          </Link>
        </p>
      </Sheet>
    </>
  );
}
