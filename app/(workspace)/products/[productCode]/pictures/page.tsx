import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { z } from "zod";

import { type ChosenMeasure, chosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { MeasureBar } from "@/app/(workspace)/_measures/measure-bar";
import { currentPreferences, requireActor } from "@/app/_server/session";
import { PageHeading } from "@/app/_components/page-heading";
import { SectionHeading } from "@/app/_components/section-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import type { BudgetAt } from "@/lib/budget/views";
import type { PointResult } from "@/lib/evaluation/budget/results";
import { readText } from "@/lib/evaluation/measures/reading";
import { abilityFor, covers } from "@/policies/ability";

import { AsStoodBanner } from "../_components/as-stood-banner";
import { NotEstablished } from "../_components/not-established";
import { PointChoice } from "../_components/point-choice";
import { ServiceWindCaution } from "../_components/service-wind-caution";
import { budgetFields } from "../_components/sheet-fields";
import { pageBudget, pageProduct } from "../_server/read-page";
import { budgetSheet, pointOf, sheetBasis } from "../_sheet/budget-sheet";
import { streamText } from "../_sheet/stream-text";
import { AllocationsFigure } from "./_components/allocations-figure";
import { PointsFigure } from "./_components/points-figure";
import { SensitivityFigure } from "./_components/sensitivity-figure";
import { SpeedFigures } from "./_components/speed-figures";

type Props = PageProps<"/products/[productCode]/pictures">;

const Query = z.object({
  point: z.string().optional().catch(undefined),
  issue: z.coerce.number().int().positive().optional().catch(undefined),
  measure: z.string().trim().max(120).optional().catch(undefined),
});
type Query = z.output<typeof Query>;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Pictures of ${(await params).productCode}` };
}

export default async function PicturesPage({ params, searchParams }: Props) {
  const { productCode } = await params;
  const query = Query.parse(await searchParams);
  const [actor, preferences, product, budget] = await Promise.all([
    requireActor(),
    currentPreferences(),
    pageProduct(productCode),
    pageBudget(productCode, query),
  ]);
  if (!budget) {
    const mayEstablish = covers(abilityFor(actor), { on: "Product", action: "establish", productId: product.id });
    return <NotEstablished product={product} mayEstablish={mayEstablish} />;
  }
  const point = pointOf(budget, query.point);
  if (!point) notFound();
  const chosen = chosenMeasure(query.measure, preferences, [sheetBasis(budgetSheet(budget, point))]);

  return (
    <>
      <PageHeading
        title="Pictures"
        subtitle={`${product.code} · ${product.name} · issue ${budget.issue.number} · ${streamText(point, chosen.units)}`}
      />
      <PicturesMatter budget={budget} point={point} query={query} chosen={chosen} />
    </>
  );
}

interface PicturesMatterProps {
  budget: BudgetAt;
  point: PointResult;
  query: Query;
  chosen: ChosenMeasure;
}

function PicturesMatter({ budget, point, query, chosen }: PicturesMatterProps) {
  const readingAt = (at: PointResult) => readingFor(chosen, sheetBasis(budgetSheet(budget, at)));
  const reference = pointOf(budget, budget.allocations.operatingPoint) ?? point;
  const reading = readingAt(point);

  return (
    <Sheet titleBlock={<TitleBlock fields={budgetFields(budget, point)} />}>
      <AsStoodBanner budget={budget} newestHref={picturesAddress(budget, query, { issue: undefined })} />
      <ServiceWindCaution kind={budget.product.kind} />
      <MeasureBar chosen={chosen} reading={reading} hrefOf={(measure) => picturesAddress(budget, query, { measure })} />
      <SectionHeading>Every operating point</SectionHeading>
      <PointsFigure budget={budget} chosen={chosen} />
      <SectionHeading aside={`at ${budget.allocations.operatingPoint}`}>Items against their allocations</SectionHeading>
      <AllocationsFigure budget={budget} reading={readingAt(reference)} />
      <SectionHeading aside={`at ${point.operatingPoint}`}>What moves the total</SectionHeading>
      <PointChoice
        points={budget.results.points}
        worstPoint={budget.results.worstPoint}
        chosen={point.operatingPoint}
        hrefOf={(operatingPoint) => picturesAddress(budget, query, { point: operatingPoint })}
        print={(at, newtons) => readText(readingAt(at), newtons)}
      />
      <SensitivityFigure state={budget.state} point={point} reading={reading} />
      <SectionHeading aside={`at ${point.operatingPoint}`}>Over speed</SectionHeading>
      <SpeedFigures budget={budget} point={point} chosen={chosen} />
    </Sheet>
  );
}

/** The same sheet with some of its address changed. */
function picturesAddress({ product }: BudgetAt, query: Query, change: Partial<Query>): string {
  const { point, issue, measure } = { ...query, ...change };
  const parts = new URLSearchParams();
  if (point !== undefined) parts.set("point", point);
  if (issue !== undefined) parts.set("issue", String(issue));
  if (measure !== undefined) parts.set("measure", measure);
  const text = parts.toString();
  return `/products/${product.code}/pictures${text === "" ? "" : `?${text}`}`;
}
