import type { Metadata } from "next";
import { notFound } from "next/navigation";

import { type ChosenMeasure, chosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { MeasureBar } from "@/app/(workspace)/_measures/measure-bar";
import { currentPreferences, requireActor } from "@/app/_server/session";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import type { SheetAt } from "@/lib/budget/sheet-at";
import type { SheetPoint } from "@/lib/budget/sheet-data";
import { readText } from "@/lib/evaluation/measures/reading";
import { abilityFor, covers } from "@/policies/ability";

import { AsStoodBanner } from "../_components/as-stood-banner";
import { NotEstablished } from "../_components/not-established";
import { PointChoice } from "../_components/point-choice";
import { ServiceWindCaution } from "../_components/service-wind-caution";
import { budgetFields } from "../_components/sheet-fields";
import { WorkingsProvider } from "../_components/workings-provider";
import { pageProduct } from "../_server/read-page";
import { pageSheet } from "../_server/read-sheet";
import { sheetAddress } from "../_sheet/sheet-address";
import { SheetQuery } from "../_sheet/sheet-filter";
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
  const [actor, preferences, product, found] = await Promise.all([
    requireActor(),
    currentPreferences(),
    pageProduct(productCode),
    pageSheet(productCode, query),
  ]);
  const ability = abilityFor(actor);
  if (!found) {
    const mayEstablish = covers(ability, { on: "Product", action: "establish", productId: product.id });
    return <NotEstablished product={product} mayEstablish={mayEstablish} />;
  }

  const { sheet, issue } = found;
  const point = sheet.points.find(({ operatingPoint }) => operatingPoint === sheet.operatingPoint);
  if (!point) notFound();
  const chosen = chosenMeasure(query.measure, preferences, [point.basis]);
  const mayStart = covers(ability, { on: "Product", action: "start_draft", productId: product.id });

  return (
    <>
      <PageHeading
        title={product.name}
        subtitle={`${product.code} · issue ${issue.number} · ${streamText(point, chosen.units)}`}
        actions={
          <BudgetActions
            productCode={product.code}
            issue={issue.number}
            operatingPoint={point.operatingPoint}
            measure={chosen}
            mayStart={mayStart}
          />
        }
      />
      <BudgetMatter found={found} point={point} query={query} userId={actor.userId} chosen={chosen} />
    </>
  );
}

interface BudgetMatterProps {
  found: SheetAt;
  point: SheetPoint;
  query: SheetQuery;
  userId: number;
  chosen: ChosenMeasure;
}

function BudgetMatter({ found, point, query, userId, chosen }: BudgetMatterProps) {
  const { sheet, product, issue } = found;
  const { units } = chosen;
  const readingAt = ({ basis }: SheetPoint) => readingFor(chosen, basis);
  const reading = readingAt(point);
  const reference = sheet.points.find(({ operatingPoint }) => operatingPoint === sheet.referencePoint);
  const path = `/products/${product.code}/budget`;
  const asStood = SheetQuery.parse({ issue: query.issue, on: query.on });
  const uncertaintyHref = sheetAddress(`/products/${product.code}/uncertainty`, asStood, {
    point: point.operatingPoint,
  });

  return (
    <Sheet titleBlock={<TitleBlock fields={budgetFields(found, point)} />}>
      <AsStoodBanner budget={found} newestHref={sheetAddress(path, query, { issue: undefined, on: undefined })} />
      {query.issue === undefined && query.on === undefined ? (
        <NewerIssue productCode={product.code} shown={issue.number} />
      ) : null}
      <ServiceWindCaution kind={product.kind} />
      <WorkingsProvider
        productCode={product.code}
        issue={issue.number}
        point={point.operatingPoint}
        read={{ measure: reading.measure, units }}
      >
        <PointChoice
          points={sheet.points}
          worstPoint={sheet.worstPoint}
          chosen={point.operatingPoint}
          hrefOf={(operatingPoint) => sheetAddress(path, query, { point: operatingPoint })}
          print={(at, newtons) => readText(readingAt(at), newtons)}
        />
        <MeasureBar chosen={chosen} reading={reading} hrefOf={(measure) => sheetAddress(path, query, { measure })} />
        <StandingHead point={point} reading={reading} />
        <UncertaintyLine sheet={sheet} href={uncertaintyHref} />
        <StaveFigure rows={sheet.rows} point={point} reading={reading} />
        <BudgetItems found={found} point={point} query={query} userId={userId} reading={reading} units={units} />
        <ConservationLine
          sums={sheet.allocations}
          reading={readingAt(reference ?? point)}
          reserveHref={`${sheetAddress(`/products/${product.code}/operating-points`, asStood, {})}#reserve`}
        />
        <MeasuresTable point={point} units={units} />
      </WorkingsProvider>
      <RetiredLines lines={sheet.retired} />
    </Sheet>
  );
}
