import type { Metadata } from "next";
import { notFound } from "next/navigation";

import { requireActor } from "@/app/_server/session";
import { EmptyNote } from "@/app/_components/empty-note";
import { PageHeading } from "@/app/_components/page-heading";
import { SectionHeading } from "@/app/_components/section-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { measuredAgainstEstimated } from "@/lib/budget/measured-against-estimated";
import { LEAST_PAIRS } from "@/lib/evaluation/budget/estimate-to-test";

import { budgetFields } from "../_components/sheet-fields";
import { pageBudget, readForPage } from "../_server/read-page";
import { GrowthTable } from "./_components/growth-table";
import { MethodsTable } from "./_components/methods-table";
import { PairsTable } from "./_components/pairs-table";

type Props = PageProps<"/products/[productCode]/growth">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Estimate-to-test growth of ${(await params).productCode}` };
}

/** What tests made of the estimates before them, and what growth table that would suggest. */
export default async function GrowthPage({ params }: Props) {
  const { productCode } = await params;
  const [actor, budget] = await Promise.all([requireActor(), pageBudget(productCode, {})]);
  if (!budget) notFound();

  const { pairs, leftOut, suggestions } = await readForPage(() => measuredAgainstEstimated(actor, productCode));
  const base = `/products/${budget.product.code}`;

  return (
    <>
      <PageHeading
        title="Estimate-to-test growth"
        subtitle={`${budget.product.code} · ${budget.product.name} · basic estimates at the reference operating point`}
      />
      <Sheet titleBlock={<TitleBlock fields={budgetFields(budget, null)} />}>
        {pairs.length === 0 ? (
          <EmptyNote title="No estimate has been replaced by a measured value yet.">
            When a revision raises an item to a measured grade, its last estimate of each grade and the measured value
            stand here side by side.
          </EmptyNote>
        ) : (
          <>
            <PairsTable pairs={pairs} base={base} />
            <SectionHeading>By method of the estimate</SectionHeading>
            <MethodsTable pairs={pairs} />
          </>
        )}
        {leftOut > 0 ? <p className="mt-2 text-sm text-ink-2">{leftOutSentence(leftOut)}</p> : null}
        <SectionHeading aside="changed by a proposal on the terms">Growth table</SectionHeading>
        <GrowthTable suggestions={suggestions} />
        <p className="mt-2 max-w-[75ch] text-sm text-ink-2">
          Suggested is the mean growth of a grade, not below 0, rounded up to a whole per cent, from at least{" "}
          {LEAST_PAIRS} pairs (common practice, no source). Fewer pairs suggest nothing.
        </p>
      </Sheet>
    </>
  );
}

function leftOutSentence(count: number): string {
  const pairs = count === 1 ? "One pair is" : `${count} pairs are`;
  return `${pairs} left out: between estimate and test the reference operating point changed, or one of the two has no value.`;
}
