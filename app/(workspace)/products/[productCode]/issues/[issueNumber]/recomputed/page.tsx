import type { Metadata } from "next";
import { z } from "zod";
import { notFound } from "next/navigation";

import { requireActor } from "@/app/_server/session";
import { Notice } from "@/app/_components/notice";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { recomputedToday } from "@/lib/budget/recomputed-today";

import { budgetFields } from "@/app/(workspace)/products/[productCode]/_components/sheet-fields";
import { PointChoice } from "@/app/(workspace)/products/[productCode]/_components/point-choice";
import { pageBudget, readForPage } from "@/app/(workspace)/products/[productCode]/_server/read-page";
import { pointOf } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { sheetAddress } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-address";
import { SheetQuery } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-filter";
import { RecomputedTable } from "./_components/recomputed-table";
import { differencesSentence } from "./_components/differences-sentence";

type Props = PageProps<"/products/[productCode]/issues/[issueNumber]/recomputed">;

const IssueNumber = z.coerce.number().int().positive();

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { productCode, issueNumber } = await params;
  return { title: `Issue ${issueNumber} of ${productCode}, recomputed today` };
}

/** What an issue keeps, beside what today's code makes of the same lines: never instead of it. */
export default async function RecomputedPage({ params, searchParams }: Props) {
  const { productCode, issueNumber } = await params;
  const issue = IssueNumber.safeParse(issueNumber);
  if (!issue.success) notFound();

  const query = SheetQuery.parse(await searchParams);
  const [actor, budget] = await Promise.all([requireActor(), pageBudget(productCode, { issue: issue.data })]);
  const point = budget ? pointOf(budget, query.point) : undefined;
  if (!budget || !point) notFound();

  const { points, differences } = await readForPage(() => recomputedToday(actor, productCode, issue.data));
  const shown = points.find(({ operatingPoint }) => operatingPoint === point.operatingPoint);
  const path = `/products/${budget.product.code}/issues/${issue.data}/recomputed`;

  return (
    <>
      <PageHeading
        title={`Issue ${issue.data}, recomputed today`}
        subtitle={`${budget.product.code} · ${budget.product.name} · what was signed stays what it is`}
      />
      <Sheet titleBlock={<TitleBlock fields={budgetFields(budget, point)} />}>
        <Notice kind={differences.length === 0 ? "done" : "caution"}>{differencesSentence(differences)}</Notice>
        <PointChoice
          points={budget.results.points}
          worstPoint={budget.results.worstPoint}
          chosen={point.operatingPoint}
          hrefOf={(operatingPoint) => sheetAddress(path, query, { point: operatingPoint })}
        />
        {shown ? <RecomputedTable point={shown} /> : null}
      </Sheet>
    </>
  );
}
