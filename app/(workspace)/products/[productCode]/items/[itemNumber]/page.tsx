import type { Metadata } from "next";
import { notFound } from "next/navigation";

import { type ChosenMeasure, chosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { MeasureBar } from "@/app/(workspace)/_measures/measure-bar";
import { currentPreferences, requireActor } from "@/app/_server/session";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { lineHistory } from "@/lib/budget/line-history";
import type { BudgetAt, LineRevisionView } from "@/lib/budget/views";
import { findLine } from "@/lib/evaluation/budget/indexed-state";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import type { LineOf } from "@/lib/evaluation/lines/line-state";
import type { PointResult } from "@/lib/evaluation/budget/results";
import { type ItemFile, itemFiles } from "@/lib/proposals/reading/item-files";

import { AsStoodBanner } from "@/app/(workspace)/products/[productCode]/_components/as-stood-banner";
import { budgetFields } from "@/app/(workspace)/products/[productCode]/_components/sheet-fields";
import { ServiceWindCaution } from "@/app/(workspace)/products/[productCode]/_components/service-wind-caution";
import { pageBudget, readForPage } from "@/app/(workspace)/products/[productCode]/_server/read-page";
import { budgetSheet, pointOf, sheetBasis } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { sheetAddress } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-address";
import { SheetQuery } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-filter";
import { ItemMatter } from "./_components/item-matter";
import { RetiredItem } from "./_components/retired-item";
import type { PointRow } from "./_components/results-table";

type Props = PageProps<"/products/[productCode]/items/[itemNumber]">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { productCode, itemNumber } = await params;
  return { title: `Item ${itemNumber} of ${productCode}` };
}

export default async function ItemPage({ params, searchParams }: Props) {
  const { productCode, itemNumber } = await params;
  const query = SheetQuery.parse(await searchParams);
  const [actor, preferences, budget] = await Promise.all([
    requireActor(),
    currentPreferences(),
    pageBudget(productCode, query),
  ]);
  const line = budget ? findLine(budget.state, "item", itemNumber) : undefined;
  if (!budget || line?.kind !== "item") notFound();

  const revisions = await readForPage(() => lineHistory(actor, productCode, "item", itemNumber));
  const files = await readForPage(() => itemFiles(actor, productCode, itemNumber, budget.issue.number));
  const until = revisions.filter(({ issue }) => issue.number <= budget.issue.number);
  const path = `/products/${budget.product.code}/items/${itemNumber}`;
  const point = pointOf(budget, query.point);
  if (!point) notFound();
  const chosen = chosenMeasure(query.measure, preferences, [sheetBasis(budgetSheet(budget, point))]);

  return (
    <>
      <PageHeading
        title={`${itemNumber} ${line.body.name}`}
        subtitle={`${budget.product.code} · issue ${budget.issue.number} · ${ITEM_METHODS[line.body.method].label}`}
      />
      <Sheet titleBlock={<TitleBlock fields={budgetFields(budget, null)} />}>
        <AsStoodBanner budget={budget} newestHref={sheetAddress(path, query, { issue: undefined, on: undefined })} />
        <ServiceWindCaution kind={budget.product.kind} />
        {line.retired ? (
          <RetiredItem line={line} revisions={until} productCode={budget.product.code} />
        ) : (
          <ItemInForce
            line={line}
            budget={budget}
            point={point}
            chosen={chosen}
            query={query}
            revisions={until}
            files={files}
          />
        )}
      </Sheet>
    </>
  );
}

interface ItemInForceProps {
  line: LineOf<"item">;
  budget: BudgetAt;
  point: PointResult;
  chosen: ChosenMeasure;
  query: SheetQuery;
  revisions: readonly LineRevisionView[];
  files: readonly ItemFile[];
}

function ItemInForce({ line, budget, point, chosen, query, revisions, files }: ItemInForceProps) {
  const path = `/products/${budget.product.code}/items/${line.number}`;

  return (
    <>
      <MeasureBar
        chosen={chosen}
        reading={readingFor(chosen, sheetBasis(budgetSheet(budget, point)))}
        hrefOf={(measure) => sheetAddress(path, query, { measure })}
      />
      <ItemMatter
        line={line}
        points={pointRows(budget, line.number)}
        shownAt={point.operatingPoint}
        measure={chosen}
        hrefOf={(operatingPoint) => sheetAddress(path, query, { point: operatingPoint })}
        revisions={revisions}
        files={files}
        now={new Date()}
      />
    </>
  );
}

function pointRows(budget: BudgetAt, itemNumber: string): PointRow[] {
  return budget.results.points.flatMap((point) => {
    const sheet = budgetSheet(budget, point);
    const row = sheet.rows.find((candidate) => candidate.kind === "item" && candidate.number === itemNumber);
    return row?.kind === "item" ? [{ sheet, row }] : [];
  });
}
