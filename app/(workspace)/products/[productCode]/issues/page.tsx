import type { Metadata } from "next";

import { chosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { MeasureBar } from "@/app/(workspace)/_measures/measure-bar";
import { currentPreferences, requireActor } from "@/app/_server/session";
import { PageHeading } from "@/app/_components/page-heading";
import { SectionHeading } from "@/app/_components/section-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { compareIssues } from "@/lib/budget/compare-issues";
import { issuesOf, trendOf } from "@/lib/budget/queries";
import { indexState } from "@/lib/evaluation/budget/indexed-state";
import { abilityFor, covers } from "@/policies/ability";

import { NotEstablished } from "../_components/not-established";
import { PointLinks } from "../_components/point-links";
import { ServiceWindCaution } from "../_components/service-wind-caution";
import { budgetFields } from "../_components/sheet-fields";
import { TrendFigure } from "../_components/trend-figure";
import { pageBudget, pageProduct, readForPage } from "../_server/read-page";
import { pointOf } from "../_sheet/budget-sheet";
import { Baselines } from "./_components/baselines";
import { ComparedTotals } from "./_components/compared-totals";
import { Comparison } from "./_components/comparison";
import { IssueForms } from "./_components/issue-forms";
import { IssuesTable } from "./_components/issues-table";
import { issuesAddress, issuesQuery } from "./_components/issues-query";

type Props = PageProps<"/products/[productCode]/issues">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Issues of ${(await params).productCode}` };
}

export default async function IssuesPage({ params, searchParams }: Props) {
  const { productCode } = await params;
  const query = issuesQuery(await searchParams);
  const [actor, preferences, product, budget] = await Promise.all([
    requireActor(),
    currentPreferences(),
    pageProduct(productCode),
    pageBudget(productCode, {}),
  ]);
  if (!budget) {
    const mayEstablish = covers(abilityFor(actor), { on: "Product", action: "establish", productId: product.id });
    return <NotEstablished product={product} mayEstablish={mayEstablish} />;
  }

  const { compare } = query;
  const [issues, trend, comparison] = await readForPage(() =>
    Promise.all([
      issuesOf(actor, productCode),
      trendOf(actor, productCode),
      compare ? compareIssues(actor, productCode, compare.from, compare.to) : null,
    ]),
  );
  const { terms } = indexState(budget.state);
  const point = pointOf(budget, query.point) ?? budget.results.points[0];
  const operatingPoint = point?.operatingPoint ?? terms.referenceOperatingPoint;
  const bases = (trend.at(-1)?.points ?? []).flatMap((at) => (at.operatingPoint === operatingPoint ? at.basis : []));
  const measure = chosenMeasure(query.measure, preferences, bases);

  return (
    <>
      <PageHeading
        title="Issues"
        subtitle={`${product.code} · ${product.name} · newest is issue ${budget.issue.number}`}
      />
      <Sheet titleBlock={<TitleBlock fields={budgetFields(budget, point ?? null)} />}>
        <ServiceWindCaution kind={product.kind} />
        <PointLinks
          points={budget.results.points}
          chosen={operatingPoint}
          hrefOf={(at) => issuesAddress(product.code, query, { point: at })}
        />
        {bases.map((basis) => (
          <MeasureBar
            key={operatingPoint}
            chosen={measure}
            reading={readingFor(measure, basis)}
            hrefOf={(next) => issuesAddress(product.code, query, { measure: next })}
          />
        ))}
        <TrendFigure
          trend={trend}
          operatingPoint={operatingPoint}
          planned={operatingPoint === terms.referenceOperatingPoint ? terms.plannedProfile : []}
          until={new Date().toISOString()}
          measure={measure}
        />
        <IssueForms
          productCode={product.code}
          numbers={issues.map(({ number }) => number)}
          compare={compare}
          operatingPoint={operatingPoint}
          measure={query.measure}
        />
        {comparison ? (
          <Comparison
            comparison={comparison}
            trend={trend}
            operatingPoint={operatingPoint}
            productCode={product.code}
          />
        ) : null}
        {compare ? (
          <ComparedTotals trend={trend} compare={compare} operatingPoint={operatingPoint} measure={measure} />
        ) : null}
        <Baselines
          productCode={product.code}
          issues={issues}
          maySign={covers(abilityFor(actor), { on: "Product", action: "make_baseline", productId: product.id })}
        />
        <SectionHeading>All issues</SectionHeading>
        <IssuesTable
          issues={issues}
          trend={trend}
          operatingPoint={operatingPoint}
          productCode={product.code}
          measure={measure}
        />
      </Sheet>
    </>
  );
}
