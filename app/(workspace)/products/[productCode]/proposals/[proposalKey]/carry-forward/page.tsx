import type { Metadata } from "next";
import { forbidden, notFound } from "next/navigation";

import { MessageSheet } from "@/app/_components/message-sheet";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { requireActor } from "@/app/_server/session";
import { settlementView } from "@/lib/proposals/queries";
import type { SettlementView } from "@/lib/proposals/workspace-views";
import { Refusal } from "@/lib/vocabulary/refusal";

import { SettlementForm } from "./_components/settlement-form";

type Props = PageProps<"/products/[productCode]/proposals/[proposalKey]/carry-forward">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { productCode, proposalKey } = await params;

  return { title: `Carry forward proposal ${proposalKey} of ${productCode}` };
}

export default async function CarryForwardPage({ params }: Props) {
  const { productCode, proposalKey } = await params;
  const view = await viewOrRefusal(productCode, proposalKey);
  if (view instanceof Refusal) {
    return <MessageSheet title="Nothing to carry forward">{view.message}</MessageSheet>;
  }

  return (
    <>
      <PageHeading
        title={`Carry forward to issue ${view.ontoIssue}`}
        subtitle={`${productCode} · proposal ${proposalKey} · drafted on issue ${view.baseIssue}`}
      />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Product", value: productCode },
              { label: "From issue", value: view.baseIssue },
              { label: "To issue", value: view.ontoIssue },
            ]}
          />
        }
      >
        <SettlementForm view={view} productCode={productCode} proposalKey={proposalKey} />
      </Sheet>
    </>
  );
}

async function viewOrRefusal(productCode: string, proposalKey: string): Promise<SettlementView | Refusal> {
  const actor = await requireActor();
  try {
    return await settlementView(actor, productCode, proposalKey);
  } catch (problem) {
    if (!(problem instanceof Refusal)) throw problem;
    if (problem.code === "not_found") notFound();
    if (problem.code === "forbidden") forbidden();

    return problem;
  }
}
