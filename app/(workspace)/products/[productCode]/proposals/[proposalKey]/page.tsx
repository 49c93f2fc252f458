import type { Metadata } from "next";
import { notFound } from "next/navigation";

import { chosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { EFFECT_IN_NEWTONS, effectReadings } from "@/app/(workspace)/_measures/effect-readings";
import { MeasureBar } from "@/app/(workspace)/_measures/measure-bar";
import { ExportMenu } from "@/app/_components/export-menu";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { dayText } from "@/app/_components/utc-text";
import { currentPreferences, requireActor } from "@/app/_server/session";
import { budgetWith } from "@/lib/proposals/reading/budget-with";
import { noteSheetSeen } from "@/lib/proposals/reading/note-sheet-seen";
import { noteOpened } from "@/lib/proposals/records/opened-texts";
import { proposalView } from "@/lib/proposals/queries";
import type { ProposalView } from "@/lib/proposals/views";
import type { Preferences } from "@/lib/vocabulary/measures";

import { readForPage } from "@/app/(workspace)/products/[productCode]/_server/read-page";
import { stateWords } from "../_components/state-words";
import { ChangeSheet } from "./_components/change-sheet";
import { effectShown } from "./_components/effect-shown";
import { ProposalMoves } from "./_components/proposal-moves";
import { SignOffTable } from "./_components/sign-off-table";
import { WhatSignersOpened } from "./_components/what-signers-opened";

type Props = PageProps<"/products/[productCode]/proposals/[proposalKey]">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { productCode, proposalKey } = await params;

  return { title: `Proposal ${proposalKey} of ${productCode}` };
}

export default async function ProposalPage({ params, searchParams }: Props) {
  const { productCode, proposalKey } = await params;
  const query = await searchParams;
  const round = roundAsked(query.round);
  const [actor, preferences] = await Promise.all([requireActor(), currentPreferences()]);
  const proposal = await readForPage(() => proposalView(actor, productCode, proposalKey, round));
  if (!proposal) notFound();
  const base = `/products/${productCode}/proposals/${proposal.key}`;
  const measured = measureOf(proposal, measureAsked(query.measure), preferences);
  if (proposal.signingSheet) await noteOpened(actor, proposal.signingSheet.textHash);
  const budget = proposal.signingSheet ? await budgetWith(actor, productCode, proposalKey) : null;
  const moved = round === undefined ? await noteSheetSeen(actor, proposal) : null;

  return (
    <>
      <PageHeading
        title={proposal.title}
        subtitle={subtitleOf(proposal)}
        actions={
          <ExportMenu
            entries={[
              { label: "Change as a unified patch", href: `/products/${productCode}/proposals/${proposal.key}/patch` },
            ]}
          />
        }
      />
      <Sheet
        titleBlock={<TitleBlock fields={titleFields(proposal)} />}
        foot={
          <SignOffTable
            routing={proposal.routing}
            namedBecause={proposal.namedBecause}
            signatures={proposal.signatures}
          >
            <WhatSignersOpened proposal={proposal} />
            <ProposalMoves proposal={proposal} readerId={actor.userId} />
          </SignOffTable>
        }
      >
        {measured ? (
          <MeasureBar
            chosen={measured.chosen}
            reading={measured.reading}
            hrefOf={(measure) => `${base}?${round === undefined ? "" : `round=${round}&`}measure=${measure}`}
          />
        ) : null}
        <ChangeSheet
          proposal={proposal}
          readings={measured ? measured.readings : EFFECT_IN_NEWTONS}
          budgetWith={budget}
          moved={moved}
          onlyMoved={query.only === "moved"}
          now={new Date()}
        />
      </Sheet>
    </>
  );
}

/** In what the effects are read; nothing where there is none yet. */
function measureOf(proposal: ProposalView, asked: string | undefined, preferences: Preferences) {
  const effect = effectShown(proposal);
  const worst = effect?.bases.find(({ operatingPoint }) => operatingPoint === effect.points[0]?.operatingPoint);
  const basis = worst?.now ?? worst?.was;
  if (!effect || !basis) return null;
  const chosen = chosenMeasure(asked, preferences, [basis]);
  return { chosen, reading: readingFor(chosen, basis), readings: effectReadings(chosen, effect.bases) };
}

function measureAsked(text: string | string[] | undefined): string | undefined {
  return typeof text === "string" ? text : undefined;
}

function roundAsked(text: string | string[] | undefined): number | undefined {
  return typeof text === "string" && /^[1-9]\d{0,3}$/.test(text) ? Number(text) : undefined;
}

function subtitleOf(proposal: ProposalView): string {
  const parts = [
    proposal.label,
    stateWords(proposal.state, proposal.round?.round ?? 0),
    `proposed by ${proposal.proposer.name}`,
    proposal.round ? `on issue ${proposal.round.baseIssue}` : "not submitted yet",
  ];
  if (proposal.neededBy) parts.push(`needed by ${dayText(proposal.neededBy)}`);

  return parts.join(" · ");
}

function titleFields(proposal: ProposalView) {
  const approvers = proposal.signatures.filter(({ counts, decision }) => counts && decision === "approve");

  return [
    { label: "Product", value: `${proposal.product.code} ${proposal.product.name}` },
    { label: "Change sheet", value: proposal.label },
    { label: "Round", value: proposal.round?.round ?? "–" },
    { label: "Proposed", value: proposal.proposer.name },
    { label: "Approved", value: approvers.map(({ printedName }) => printedName).join(", ") || "–" },
    {
      label: proposal.approvedAsIssue ? "Made issue" : "Newest issue",
      value: proposal.approvedAsIssue ?? proposal.newestIssue,
    },
  ];
}
