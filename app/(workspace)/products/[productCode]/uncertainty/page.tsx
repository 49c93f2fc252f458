import type { Metadata } from "next";
import { notFound } from "next/navigation";

import { requireActor } from "@/app/_server/session";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { runsOf } from "@/lib/budget/monte-carlo/runs-of";
import { abilityFor, covers } from "@/policies/ability";

import { AsStoodBanner } from "../_components/as-stood-banner";
import { NotEstablished } from "../_components/not-established";
import { PointChoice } from "../_components/point-choice";
import { ServiceWindCaution } from "../_components/service-wind-caution";
import { budgetFields } from "../_components/sheet-fields";
import { WorkingsProvider } from "../_components/workings-provider";
import { pageBudget, pageProduct, readForPage } from "../_server/read-page";
import { budgetSheet, pointOf } from "../_sheet/budget-sheet";
import { sheetAddress } from "../_sheet/sheet-address";
import { SheetQuery } from "../_sheet/sheet-filter";
import { streamText } from "../_sheet/stream-text";
import { UncertaintyMatter } from "./_components/uncertainty-matter";

type Props = PageProps<"/products/[productCode]/uncertainty">;

export async function generateMetadata({ params, searchParams }: Props): Promise<Metadata> {
  const { productCode } = await params;
  const { issue } = SheetQuery.parse(await searchParams);
  return { title: `Uncertainty of ${productCode}${issue === undefined ? "" : ` at issue ${issue}`}` };
}

/** How uncertain the total is at one operating point: as frozen with the issue, and as drawn. */
export default async function UncertaintyPage({ params, searchParams }: Props) {
  const { productCode } = await params;
  const query = SheetQuery.parse(await searchParams);
  const [actor, product, budget] = await Promise.all([
    requireActor(),
    pageProduct(productCode),
    pageBudget(productCode, query),
  ]);
  const may = (action: "establish" | "run_monte_carlo") =>
    covers(abilityFor(actor), { on: "Product", action, productId: product.id });
  if (!budget) return <NotEstablished product={product} mayEstablish={may("establish")} />;

  const point = pointOf(budget, query.point);
  if (!point) notFound();
  const issue = budget.issue.number;
  const runs = await readForPage(() => runsOf(actor, product.code, issue, point.operatingPoint));
  const path = `/products/${product.code}/uncertainty`;

  return (
    <>
      <PageHeading title="Uncertainty" subtitle={`${product.code} · issue ${issue} · ${streamText(point)}`} />
      <Sheet titleBlock={<TitleBlock fields={budgetFields(budget, point)} />}>
        <AsStoodBanner budget={budget} newestHref={sheetAddress(path, query, { issue: undefined, on: undefined })} />
        <ServiceWindCaution kind={product.kind} />
        <WorkingsProvider productCode={product.code} issue={issue} point={point.operatingPoint}>
          <PointChoice
            points={budget.results.points}
            worstPoint={budget.results.worstPoint}
            chosen={point.operatingPoint}
            hrefOf={(operatingPoint) => sheetAddress(path, query, { point: operatingPoint })}
          />
          <UncertaintyMatter sheet={budgetSheet(budget, point)} runs={runs} mayRun={may("run_monte_carlo")} />
        </WorkingsProvider>
      </Sheet>
    </>
  );
}
