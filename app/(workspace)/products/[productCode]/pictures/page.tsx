import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { z } from "zod";

import { requireActor } from "@/app/_server/session";
import { PageHeading } from "@/app/_components/page-heading";
import { SectionHeading } from "@/app/_components/section-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import type { BudgetAt } from "@/lib/budget/views";
import type { PointResult } from "@/lib/evaluation/budget/results";
import { abilityFor, covers } from "@/policies/ability";

import { AsStoodBanner } from "../_components/as-stood-banner";
import { NotEstablished } from "../_components/not-established";
import { PointChoice } from "../_components/point-choice";
import { ServiceWindCaution } from "../_components/service-wind-caution";
import { budgetFields } from "../_components/sheet-fields";
import { pageBudget, pageProduct } from "../_server/read-page";
import { pointOf } from "../_sheet/budget-sheet";
import { streamText } from "../_sheet/stream-text";
import { AllocationsFigure } from "./_components/allocations-figure";
import { PointsFigure } from "./_components/points-figure";
import { SensitivityFigure } from "./_components/sensitivity-figure";
import { SpeedFigures } from "./_components/speed-figures";

type Props = PageProps<"/products/[productCode]/pictures">;

const Query = z.object({
  point: z.string().optional().catch(undefined),
  issue: z.coerce.number().int().positive().optional().catch(undefined),
});

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Pictures of ${(await params).productCode}` };
}

export default async function PicturesPage({ params, searchParams }: Props) {
  const { productCode } = await params;
  const query = Query.parse(await searchParams);
  const [actor, product, budget] = await Promise.all([
    requireActor(),
    pageProduct(productCode),
    pageBudget(productCode, query),
  ]);
  if (!budget) {
    const mayEstablish = covers(abilityFor(actor), { on: "Product", action: "establish", productId: product.id });
    return <NotEstablished product={product} mayEstablish={mayEstablish} />;
  }
  const point = pointOf(budget, query.point);
  if (!point) notFound();

  return (
    <>
      <PageHeading
        title="Pictures"
        subtitle={`${product.code} · ${product.name} · issue ${budget.issue.number} · ${streamText(point)}`}
      />
      <PicturesMatter budget={budget} point={point} issue={query.issue} />
    </>
  );
}

interface PicturesMatterProps {
  budget: BudgetAt;
  point: PointResult;
  issue: number | undefined;
}

function PicturesMatter({ budget, point, issue }: PicturesMatterProps) {
  const path = `/products/${budget.product.code}/pictures`;
  const atIssue = issue === undefined ? "" : `&issue=${issue}`;

  return (
    <Sheet titleBlock={<TitleBlock fields={budgetFields(budget, point)} />}>
      <AsStoodBanner budget={budget} newestHref={`${path}?point=${point.operatingPoint}`} />
      <ServiceWindCaution kind={budget.product.kind} />
      <SectionHeading>Every operating point</SectionHeading>
      <PointsFigure budget={budget} />
      <SectionHeading aside={`at ${budget.allocations.operatingPoint}`}>Items against their allocations</SectionHeading>
      <AllocationsFigure budget={budget} />
      <SectionHeading aside={`at ${point.operatingPoint}`}>What moves the total</SectionHeading>
      <PointChoice
        points={budget.results.points}
        worstPoint={budget.results.worstPoint}
        chosen={point.operatingPoint}
        hrefOf={(operatingPoint) => `${path}?point=${operatingPoint}${atIssue}`}
      />
      <SensitivityFigure state={budget.state} point={point} />
      <SectionHeading aside={`at ${point.operatingPoint}`}>Over speed</SectionHeading>
      <SpeedFigures budget={budget} point={point} />
    </Sheet>
  );
}
