import type { Metadata } from "next";
import { forbidden, notFound } from "next/navigation";

import { MessageSheet } from "@/app/_components/message-sheet";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { currentPreferences, requireActor } from "@/app/_server/session";
import { type EditorView, editorView } from "@/lib/proposals/reading/editor-view";
import { Refusal } from "@/lib/vocabulary/refusal";

import { ProposalEditor } from "./_components/proposal-editor";

type Props = PageProps<"/products/[productCode]/proposals/[proposalKey]/edit">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { productCode, proposalKey } = await params;

  return { title: `Edit proposal ${proposalKey} of ${productCode}` };
}

export default async function EditProposalPage({ params }: Props) {
  const { productCode, proposalKey } = await params;
  const view = await viewOrRefusal(productCode, proposalKey);
  if (view instanceof Refusal) {
    return <MessageSheet title="This proposal can’t be edited">{view.message}</MessageSheet>;
  }
  const { draft, budget } = view;
  const preferences = await currentPreferences();

  return (
    <>
      <PageHeading
        title={draft.state === "draft" ? draft.content.title || "Draft" : `Revise ${draft.label}`}
        subtitle={`${draft.label} · ${draft.productCode} · on issue ${draft.baseIssue}${
          draft.newestIssue > draft.baseIssue ? `, the budget is at issue ${draft.newestIssue} now` : ""
        }`}
      />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Product", value: `${budget.state.product.code} ${budget.state.product.name}` },
              { label: "Change sheet", value: draft.label },
              { label: "On issue", value: draft.baseIssue },
              { label: "Proposer", value: draft.proposer.name },
            ]}
          />
        }
      >
        <ProposalEditor key={`${draft.proposalId}`} view={view} preferences={preferences} />
      </Sheet>
    </>
  );
}

async function viewOrRefusal(productCode: string, proposalKey: string): Promise<EditorView | Refusal> {
  const actor = await requireActor();
  try {
    return await editorView(actor, productCode, proposalKey);
  } catch (problem) {
    if (!(problem instanceof Refusal)) throw problem;
    if (problem.code === "not_found") notFound();
    if (problem.code === "forbidden") forbidden();

    return problem;
  }
}
