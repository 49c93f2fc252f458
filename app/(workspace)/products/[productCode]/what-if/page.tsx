import type { Metadata } from "next";
import { notFound } from "next/navigation";

import { chosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { type EffectReadings, effectReadings } from "@/app/(workspace)/_measures/effect-readings";
import { MeasureBar } from "@/app/(workspace)/_measures/measure-bar";
import { currentPreferences, requireActor } from "@/app/_server/session";
import { EmptyNote } from "@/app/_components/empty-note";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { NEWTONS } from "@/lib/evaluation/measures/reading";
import { whatIfView, type WhatIfView } from "@/lib/proposals/reading/what-if";

import { EffectSummary } from "../_components/effect-summary";
import { ItemEffects } from "../_components/item-effects";
import { ServiceWindCaution } from "../_components/service-wind-caution";
import { TouchedItems } from "../_components/touched-items";
import { readForPage } from "../_server/read-page";
import { MovedAllocations } from "./_components/moved-allocations";
import { StepsTable } from "./_components/steps-table";
import { TickTable } from "./_components/tick-table";
import { tickedKeys, whatIfAddress } from "./_components/ticked-keys";

type Props = PageProps<"/products/[productCode]/what-if">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `What if, ${(await params).productCode}` };
}

export default async function WhatIfPage({ params, searchParams }: Props) {
  const { productCode } = await params;
  const query = await searchParams;
  const ticked = tickedKeys(query.with);
  const [actor, preferences] = await Promise.all([requireActor(), currentPreferences()]);
  const view = await readForPage(() => whatIfView(actor, productCode, ticked));
  if (!view) notFound();
  const { product, issue, candidates } = view;
  const path = `/products/${product.code}/what-if`;
  const asked = typeof query.measure === "string" ? query.measure : undefined;
  const today = view.bases.flatMap(({ operatingPoint, was }) => (operatingPoint === view.worstPoint && was ? was : []));
  const chosen = chosenMeasure(asked, preferences, today);
  const reading = today[0] ? readingFor(chosen, today[0]) : NEWTONS;

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
            <MeasureBar chosen={chosen} reading={reading} hrefOf={(measure) => whatIfAddress(path, ticked, measure)} />
            <TickTable
              path={path}
              candidates={candidates}
              worstPoint={view.worstPoint}
              reading={reading}
              measure={asked}
            />
            <JointResult view={view} readings={effectReadings(chosen, view.bases)} />
          </>
        )}
      </Sheet>
    </>
  );
}

interface JointResultProps {
  view: WhatIfView;
  readings: EffectReadings;
}

function JointResult({ view: { product, steps, effect, allocations }, readings }: JointResultProps) {
  if (steps.length === 0)
    return <p className="mt-5 text-ink-2">Tick one or more to see what they would do together.</p>;

  return (
    <div className="mt-7">
      {effect ? <EffectSummary effect={effect} withLabel="with them" everyPoint readings={readings} /> : null}
      <StepsTable steps={steps} productCode={product.code} />
      {effect ? (
        <>
          <TouchedItems touches={effect.touches} readings={readings} />
          <ItemEffects heading="Results of the edited items" effects={effect.edited} readings={readings} />
          <ItemEffects heading="What only follows" effects={effect.followers} readings={readings} />
          <MovedAllocations rows={allocations} />
        </>
      ) : null}
    </div>
  );
}
