import type { Metadata } from "next";
import { notFound } from "next/navigation";

import { requireActor } from "@/app/_server/session";
import { PageHeading } from "@/app/_components/page-heading";
import { SectionHeading } from "@/app/_components/section-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { trendOf } from "@/lib/budget/queries";
import { standingSentence } from "@/lib/evaluation/budget/standing-sentence";
import { formatPercent } from "@/lib/units/format-number";

import { AsStoodBanner } from "../_components/as-stood-banner";
import { ServiceWindCaution } from "../_components/service-wind-caution";
import { budgetFields } from "../_components/sheet-fields";
import { TrendFigure } from "../_components/trend-figure";
import { pageBudget, readForPage } from "../_server/read-page";
import { type BudgetSheet, budgetSheet, pointOf } from "../_sheet/budget-sheet";
import { reportFacts } from "../_sheet/report-facts";
import { SheetQuery } from "../_sheet/sheet-filter";
import { PointsStanding } from "./_components/points-standing";
import { GreatestItems, OverItems } from "./_components/report-items";

type Props = PageProps<"/products/[productCode]/report">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Report on ${(await params).productCode}` };
}

/** One page upward: where the budget stands, how it came there, and what to look at. */
export default async function ReportPage({ params, searchParams }: Props) {
  const { productCode } = await params;
  const query = SheetQuery.parse(await searchParams);
  const [actor, budget] = await Promise.all([requireActor(), pageBudget(productCode, query)]);
  if (!budget) notFound();
  const reference = budget.results.points[0]?.operatingPoint;
  const point = pointOf(budget, query.point ?? reference);
  if (!point) notFound();

  const trend = await readForPage(() => trendOf(actor, productCode));
  const sheet = budgetSheet(budget, point);
  const { terms } = sheet.indexed;

  return (
    // What goes upward is one page: a report of usual length fits upright A4 at this size.
    <div className="print:[zoom:0.82]">
      <PageHeading
        title={`Report on ${budget.product.name}`}
        subtitle={`${budget.product.code} · issue ${budget.issue.number} · ${point.operatingPoint} ${point.name}`}
      />
      <Sheet titleBlock={<TitleBlock fields={budgetFields(budget, point)} />}>
        <AsStoodBanner budget={budget} newestHref={`/products/${budget.product.code}/report`} />
        <ServiceWindCaution kind={budget.product.kind} />
        <p className={`mb-3 text-xl font-semibold ${point.standing === "over" ? "text-signal" : ""}`}>
          {standingSentence(point)}
        </p>
        <PointsStanding points={budget.results.points} worstPoint={budget.results.worstPoint} />
        <SectionHeading aside={`at ${point.operatingPoint}, over all issues`}>Trend</SectionHeading>
        <TrendFigure
          trend={trend.filter(({ number }) => number <= budget.issue.number)}
          operatingPoint={point.operatingPoint}
          planned={sheet.isReference ? terms.plannedProfile : []}
          until={budget.issue.at}
        />
        <ReportItems sheet={sheet} />
      </Sheet>
    </div>
  );
}

function ReportItems({ sheet }: { sheet: BudgetSheet }) {
  const { greatest, over, unverified, unverifiedShare } = reportFacts(sheet);

  return (
    <>
      <SectionHeading>The five greatest items</SectionHeading>
      <GreatestItems items={greatest} />
      <SectionHeading aside={sheet.isReference ? null : "allocations are set at the reference operating point"}>
        Over their allocation
      </SectionHeading>
      <OverItems items={over} />
      <SectionHeading aside={`${formatPercent(unverifiedShare, 1)} of the predicted total`}>
        Unverified: of grade estimated
      </SectionHeading>
      <p className={unverified.length === 0 ? "text-ink-2" : undefined}>
        {unverified.map(({ number, name }) => `${number} ${name}`).join(", ") || "None."}
      </p>
      <p className="mt-4 text-sm text-ink-2">
        Margins are limit less predicted; per cent are of the limit. Results come from empirical correlations with
        scatter.
      </p>
    </>
  );
}
