import type { Metadata } from "next";
import { notFound } from "next/navigation";

import { requireActor } from "@/app/_server/session";
import { EmptyNote } from "@/app/_components/empty-note";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { whatIfView, type WhatIfView } from "@/lib/proposals/what-if";

import { EffectSummary } from "../_components/effect-summary";
import { ItemEffects } from "../_components/item-effects";
import { ServiceWindCaution } from "../_components/service-wind-caution";
import { readForPage } from "../_server/read-page";
import { MovedAllocations } from "./_components/moved-allocations";
import { StepsTable } from "./_components/steps-table";
import { TickTable } from "./_components/tick-table";
import { tickedKeys } from "./_components/ticked-keys";

type Props = PageProps<"/products/[productCode]/what-if">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `What if, ${(await params).productCode}` };
}

export default async function WhatIfPage({ params, searchParams }: Props) {
  const { productCode } = await params;
  const ticked = tickedKeys((await searchParams).with);
  const actor = await requireActor();
  const view = await readForPage(() => whatIfView(actor, productCode, ticked));
  if (!view) notFound();
  const { product, issue, candidates } = view;

  return (
    <>
      <PageHeading title="What if" subtitle={`${product.code} · ${product.name} · on issue ${issue} · saves nothing`} />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Product", value: `${product.code} ${product.name}` },
              { label: "On issue", value: issue },
              { label: "Sheet", value: "What if: approved by nobody" },
            ]}
          />
        }
      >
        <ServiceWindCaution kind={product.kind} />
        {candidates.length === 0 ? (
          <EmptyNote title="Nothing is proposed.">
            Here proposals that are not yet decided are thought of as approved together. Propose a change first.
          </EmptyNote>
        ) : (
          <>
            <TickTable
              path={`/products/${product.code}/what-if`}
              candidates={candidates}
              worstPoint={view.worstPoint}
            />
            <JointResult view={view} />
          </>
        )}
      </Sheet>
    </>
  );
}

function JointResult({ view: { product, steps, effect, allocations } }: { view: WhatIfView }) {
  if (steps.length === 0)
    return <p className="mt-5 text-ink-2">Tick one or more to see what they would do together.</p>;

  return (
    <div className="mt-7">
      {effect ? <EffectSummary effect={effect} withLabel="with them" everyPoint /> : null}
      <StepsTable steps={steps} productCode={product.code} />
      {effect ? (
        <>
          <ItemEffects heading="Results of the edited items" effects={effect.edited} />
          <ItemEffects heading="What only follows" effects={effect.followers} />
          <MovedAllocations rows={allocations} />
        </>
      ) : null}
    </div>
  );
}
