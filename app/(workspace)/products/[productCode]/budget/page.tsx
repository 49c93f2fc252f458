import type { Metadata } from "next";
import { notFound } from "next/navigation";

import { type ChosenMeasure, chosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { MeasureBar } from "@/app/(workspace)/_measures/measure-bar";
import { currentPreferences, requireActor } from "@/app/_server/session";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import type { PointResult } from "@/lib/evaluation/budget/results";
import { readText } from "@/lib/evaluation/measures/reading";
import { abilityFor, covers } from "@/policies/ability";

import { AsStoodBanner } from "../_components/as-stood-banner";
import { NotEstablished } from "../_components/not-established";
import { PointChoice } from "../_components/point-choice";
import { ServiceWindCaution } from "../_components/service-wind-caution";
import { budgetFields } from "../_components/sheet-fields";
import { WorkingsProvider } from "../_components/workings-provider";
import { pageBudget, pageProduct } from "../_server/read-page";
import { type BudgetSheet, budgetSheet, pointOf, sheetBasis } from "../_sheet/budget-sheet";
import { sheetAddress, SheetQuery } from "../_sheet/sheet-filter";
import { streamText } from "../_sheet/stream-text";
import { BudgetActions } from "./_components/budget-actions";
import { BudgetItems } from "./_components/budget-items";
import { ConservationLine } from "./_components/conservation-line";
import { MeasuresTable } from "./_components/measures-table";
import { NewerIssue } from "./_components/newer-issue";
import { RetiredLines } from "./_components/retired-lines";
import { StandingHead } from "./_components/standing-head";
import { StaveFigure } from "./_components/stave-figure";
import { UncertaintyLine } from "./_components/uncertainty-line";

type Props = PageProps<"/products/[productCode]/budget">;

export async function generateMetadata({ params, searchParams }: Props): Promise<Metadata> {
  const { productCode } = await params;
  const { issue } = SheetQuery.parse(await searchParams);
  return { title: `Budget of ${productCode}${issue === undefined ? "" : ` at issue ${issue}`}` };
}

export default async function BudgetPage({ params, searchParams }: Props) {
  const { productCode } = await params;
  const query = SheetQuery.parse(await searchParams);
  const [actor, preferences, product, budget] = await Promise.all([
    requireActor(),
    currentPreferences(),
    pageProduct(productCode),
    pageBudget(productCode, query),
  ]);
  const ability = abilityFor(actor);
  if (!budget) {
    const mayEstablish = covers(ability, { on: "Product", action: "establish", productId: product.id });
    return <NotEstablished product={product} mayEstablish={mayEstablish} />;
  }

  const point = pointOf(budget, query.point);
  if (!point) notFound();
  const sheet = budgetSheet(budget, point);
  const chosen = chosenMeasure(query.measure, preferences, [sheetBasis(sheet)]);
  const mayStart = covers(ability, { on: "Product", action: "start_draft", productId: product.id });

  return (
    <>
      <PageHeading
        title={product.name}
        subtitle={`${product.code} · issue ${budget.issue.number} · ${streamText(point, chosen.units)}`}
        actions={
          <BudgetActions
            productCode={product.code}
            issue={budget.issue.number}
            operatingPoint={point.operatingPoint}
            measure={chosen}
            mayStart={mayStart}
          />
        }
      />
      <BudgetMatter sheet={sheet} query={query} userId={actor.userId} chosen={chosen} />
    </>
  );
}

interface BudgetMatterProps {
  sheet: BudgetSheet;
  query: SheetQuery;
  userId: number;
  chosen: ChosenMeasure;
}

function BudgetMatter({ sheet, query, userId, chosen }: BudgetMatterProps) {
  const { budget, point } = sheet;
  const { units } = chosen;
  const readingAt = (at: PointResult) => readingFor(chosen, sheetBasis({ ...sheet, point: at }));
  const reading = readingAt(point);
  const reference = budget.results.points.find((each) => each.operatingPoint === budget.allocations.operatingPoint);
  const path = `/products/${budget.product.code}/budget`;
  const { issue, on } = query;
  const uncertaintyHref = sheetAddress(
    `/products/${budget.product.code}/uncertainty`,
    SheetQuery.parse({ issue, on }),
    {
      point: point.operatingPoint,
    },
  );

  return (
    <Sheet titleBlock={<TitleBlock fields={budgetFields(budget, point)} />}>
      <AsStoodBanner budget={budget} newestHref={sheetAddress(path, query, { issue: undefined, on: undefined })} />
      {query.issue === undefined && query.on === undefined ? (
        <NewerIssue productCode={budget.product.code} shown={budget.issue.number} />
      ) : null}
      <ServiceWindCaution kind={budget.product.kind} />
      <WorkingsProvider
        productCode={budget.product.code}
        issue={budget.issue.number}
        point={point.operatingPoint}
        read={{ measure: reading.measure, units }}
      >
        <PointChoice
          points={budget.results.points}
          worstPoint={budget.results.worstPoint}
          chosen={point.operatingPoint}
          hrefOf={(operatingPoint) => sheetAddress(path, query, { point: operatingPoint })}
          print={(at, newtons) => readText(readingAt(at), newtons)}
        />
        <MeasureBar chosen={chosen} reading={reading} hrefOf={(measure) => sheetAddress(path, query, { measure })} />
        <StandingHead point={point} reading={reading} />
        <UncertaintyLine sheet={sheet} href={uncertaintyHref} />
        <StaveFigure sheet={sheet} reading={reading} />
        <BudgetItems sheet={sheet} query={query} path={path} userId={userId} reading={reading} units={units} />
        <ConservationLine
          sums={budget.allocations}
          reading={readingAt(reference ?? point)}
          reserveHref={`${sheetAddress(`/products/${budget.product.code}/operating-points`, SheetQuery.parse({ issue, on }), {})}#reserve`}
        />
        <MeasuresTable sheet={sheet} units={units} />
      </WorkingsProvider>
      <RetiredLines lines={sheet.retired} />
    </Sheet>
  );
}
