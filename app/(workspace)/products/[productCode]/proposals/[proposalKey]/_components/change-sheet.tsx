import Link from "next/link";
import type { Route } from "next";

import { type EffectReadings, movesBasis, readingAt } from "@/app/(workspace)/_measures/effect-readings";
import { MarkdownText } from "@/app/_components/markdown-text";
import { Notice } from "@/app/_components/notice";
import { SectionHeading } from "@/app/_components/section-heading";
import { UtcTime } from "@/app/_components/utc-time";
import { NEWTONS } from "@/lib/evaluation/measures/reading";
import type { BudgetAt } from "@/lib/budget/views";
import type { MovedView } from "@/lib/proposals/sheet-views";
import type { ProposalView } from "@/lib/proposals/views";

import { EffectSummary } from "@/app/(workspace)/products/[productCode]/_components/effect-summary";
import { ItemEffects } from "@/app/(workspace)/products/[productCode]/_components/item-effects";
import { TouchedItems } from "@/app/(workspace)/products/[productCode]/_components/touched-items";

import { ChangeTable } from "./change-table";
import { ComparedLines } from "./compared-text";
import { effectShown } from "./effect-shown";
import { EffectsBeside } from "./effects-beside";
import { EvidenceSection } from "./evidence-section";
import { MovedNotice } from "./moved-notice";
import { RemarksSchedule } from "./remarks-schedule";
import { TransfersTable } from "./transfers-table";
import { WorkedSteps } from "./worked-steps";

interface ChangeSheetProps {
  proposal: ProposalView;
  /** In what the effects are read. */
  readings: EffectReadings;
  /** Today's budget with the round that is open to signers; null where none is. */
  budgetWith: BudgetAt | null;
  /** What moved since the reader last looked; null on a first look. */
  moved: MovedView | null;
  onlyMoved: boolean;
  now: Date;
}

/** The body of a change sheet: effect, lines field by field, what follows, evidence, reason, remarks. */
export function ChangeSheet({ proposal, readings, budgetWith, moved, onlyMoved, now }: ChangeSheetProps) {
  const effect = effectShown(proposal);
  const worst = effect?.points[0] ? readingAt(readings, effect.points[0].operatingPoint) : null;
  const baseIssue = proposal.round?.baseIssue ?? proposal.newestIssue;
  const todayIssue = effect && effect.onIssue !== baseIssue ? effect.onIssue : null;
  // Steps of a line add up only where all sides are read alike; newtons are what is kept.
  const fieldReading = worst && !movesBasis(worst) && todayIssue === null ? worst.now : NEWTONS;
  const only = onlyMoved && moved !== null;
  const mayRemark = proposal.moves.remark.applies && proposal.moves.remark.allowed;

  return (
    <>
      {moved ? <MovedNotice moved={moved} only={only} sheet={sheetAddress(proposal)} /> : null}
      <Warnings proposal={proposal} />
      {effect ? <EffectSummary effect={effect} withLabel={`with ${shortLabel(proposal)}`} readings={readings} /> : null}
      <EffectsBeside proposal={proposal} />
      {effect ? <TouchedItems touches={effect.touches} readings={readings} /> : null}
      {proposal.lines.map((line) => (
        <ChangeTable
          key={`${line.kind} ${line.number}`}
          proposalId={proposal.proposalId}
          line={line}
          baseIssue={baseIssue}
          effectReading={fieldReading}
          todayIssue={todayIssue}
          moved={moved}
          onlyMoved={only}
          mayRemark={mayRemark}
          people={proposal.addressable}
        />
      ))}
      <TransfersTable transfers={proposal.transfers} />
      {effect ? (
        <>
          <ItemEffects heading="Results of the edited items" effects={effect.edited} readings={readings} />
          <ItemEffects heading="What only follows" effects={effect.followers} readings={readings} />
        </>
      ) : null}
      {budgetWith ? <WorkedSteps budget={budgetWith} items={editedItems(proposal)} /> : null}
      <EvidenceSection proposal={proposal} now={now} />
      <section className="mt-7">
        <SectionHeading>Reason</SectionHeading>
        <MarkdownText text={proposal.reason} />
        {proposal.comparedReason && proposal.round ? (
          <ComparedLines
            compared={proposal.comparedReason}
            title={`Line by line with round ${proposal.round.round - 1}`}
          />
        ) : null}
      </section>
      <Rounds proposal={proposal} />
      <Objections proposal={proposal} />
      <RemarksSchedule
        proposalId={proposal.proposalId}
        remarks={proposal.remarks}
        mayRemark={mayRemark}
        people={proposal.addressable}
      />
    </>
  );
}

function editedItems({ lines }: ProposalView): string[] {
  return lines.flatMap(({ kind, number }) => (kind === "item" ? [number] : []));
}

function sheetAddress({ product, key }: ProposalView): string {
  return `/products/${product.code}/proposals/${key}`;
}

function shortLabel({ number, label }: ProposalView): string {
  return number === null ? label : String(number);
}

function Warnings({ proposal }: { proposal: ProposalView }) {
  const { overtaken, blocked, faults, voidedEvidence } = proposal;
  if (overtaken.length + faults.length + voidedEvidence.length === 0 && !blocked) return null;

  return (
    <div className="mb-4 space-y-2">
      {overtaken.length > 0 ? (
        <Notice kind="caution">
          <strong className="font-semibold">Overtaken.</strong> {overtaken.join(" ")} It takes no approving signature
          until it is carried forward to issue {proposal.newestIssue}.
        </Notice>
      ) : null}
      {blocked ? (
        <Notice kind="caution">
          <strong className="font-semibold">Blocked.</strong> {blocked}
        </Notice>
      ) : null}
      {voidedEvidence.map((sentence) => (
        <Notice key={sentence} kind="caution">
          <strong className="font-semibold">Evidence was voided.</strong> {sentence}. Who signs it, signs it without
          that file.
        </Notice>
      ))}
      {faults.map((fault) => (
        <Notice key={`${fault.path} ${fault.sentence}`} kind="caution">
          {fault.sentence}
        </Notice>
      ))}
    </div>
  );
}

function Rounds({ proposal }: { proposal: ProposalView }) {
  if (proposal.rounds.length < 2) return null;
  const base = sheetAddress(proposal);

  return (
    <section className="mt-7">
      <SectionHeading>Rounds</SectionHeading>
      <ul className="border-t border-ink">
        {proposal.rounds.map((round) => (
          <li key={round.round} className="border-b border-rule py-1.5">
            <Link
              className="link"
              aria-current={round.round === proposal.round?.round ? "page" : undefined}
              href={`${base}?round=${round.round}` as Route}
            >
              Round {round.round}
            </Link>
            , submitted by {round.submittedBy.name}, <UtcTime at={round.submittedAt} />, on issue {round.baseIssue}{" "}
            <span className="font-code text-xs text-ink-2" title={round.hash}>
              {round.hash.slice(0, 12)}
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}

function Objections({ proposal }: { proposal: ProposalView }) {
  if (proposal.objections.length === 0) return null;

  return (
    <section className="mt-7">
      <SectionHeading>Objections</SectionHeading>
      <ul className="border-t border-ink">
        {proposal.objections.map((objection) => (
          <li key={objection.id} className="border-b border-rule py-2">
            <p className="text-sm text-ink-2">
              {objection.by.name}, <UtcTime at={objection.at} />, round {objection.round}
            </p>
            <p className="whitespace-pre-wrap">{objection.reason}</p>
          </li>
        ))}
      </ul>
    </section>
  );
}
