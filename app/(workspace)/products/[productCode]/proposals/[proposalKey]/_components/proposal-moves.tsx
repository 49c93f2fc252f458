import type { ReactNode } from "react";

import { ButtonLink } from "@/app/_components/button";
import type { MoveView, ProposalMove, ProposalView } from "@/lib/proposals/views";
import type { Capacity } from "@/lib/vocabulary/roles";

import { DisapproveDialog, ObjectDialog, ReturnDialog, TakeBackDialog, WithdrawDialog } from "./decision-dialogs";
import { NameReviewer } from "./name-reviewer";
import { SignDialog } from "./sign-dialog";

interface ProposalMovesProps {
  proposal: ProposalView;
  readerId: number;
}

/** What the reader may do with the proposal now; where they may not, the sentence why. */
export function ProposalMoves({ proposal, readerId }: ProposalMovesProps) {
  const { moves } = proposal;
  const base = `/products/${proposal.product.code}/proposals/${proposal.key}`;
  const sentences = [...new Set(Object.values(moves).flatMap(barredSentence))];

  return (
    <div className="mt-4 print:hidden">
      <div className="flex flex-wrap gap-2">
        <Signing proposal={proposal} readerId={readerId} />
        {open(moves, "take_back") ? <TakeBackDialog proposalId={proposal.proposalId} /> : null}
        {open(moves, "edit") ? <ButtonLink href={`${base}/edit`}>Revise…</ButtonLink> : null}
        {open(moves, "carry_forward") ? (
          <ButtonLink href={`${base}/carry-forward`}>Carry forward to issue {proposal.newestIssue}…</ButtonLink>
        ) : null}
        {open(moves, "name_reviewer") ? <NameReviewer proposal={proposal} /> : null}
        {open(moves, "object") ? <ObjectDialog proposalId={proposal.proposalId} /> : null}
        {open(moves, "withdraw") ? <WithdrawDialog proposalId={proposal.proposalId} label={proposal.label} /> : null}
      </div>
      {sentences.map((sentence) => (
        <p key={sentence} className="mt-2 text-sm text-ink-2">
          {sentence}
        </p>
      ))}
    </div>
  );
}

function Signing({ proposal, readerId }: ProposalMovesProps): ReactNode {
  const { moves, signingSheet: sheet, proposalId, label } = proposal;
  if (!sheet) return null;
  const capacities: { capacity: Capacity; move: ProposalMove }[] = [
    { capacity: "reviewer", move: "sign_as_reviewer" },
    { capacity: "program_manager", move: "sign_as_program_manager" },
  ];
  const deputiesOf = (wanted: Capacity) =>
    proposal.deputyFor.filter(({ capacity }) => capacity === wanted).map(({ person }) => person);
  const mine = capacities.filter(({ move }) => open(moves, move));

  return (
    <>
      {mine.map(({ capacity }) => (
        <SignDialog
          key={capacity}
          proposalId={proposalId}
          label={label}
          capacity={capacity}
          sheet={sheet}
          deputyFor={deputiesOf(capacity)}
          ownRight={inOwnRight(proposal, capacity, readerId)}
        />
      ))}
      {open(moves, "return") ? (
        <ReturnDialog
          proposalId={proposalId}
          roundHash={sheet.roundHash}
          capacity={moves.sign_as_reviewer.applies ? "reviewer" : "program_manager"}
        />
      ) : null}
      {open(moves, "disapprove") ? (
        <DisapproveDialog
          proposalId={proposalId}
          label={label}
          sheet={sheet}
          deputyForId={
            inOwnRight(proposal, "program_manager", readerId) ? null : (deputiesOf("program_manager")[0]?.id ?? null)
          }
        />
      ) : null}
    </>
  );
}

function inOwnRight({ routing }: ProposalView, wanted: Capacity, readerId: number): boolean {
  const capacity = routing?.capacities.find((one) => one.capacity === wanted);

  return capacity?.maySign.some(({ id }) => id === readerId) ?? false;
}

function open(moves: ProposalView["moves"], move: ProposalMove): boolean {
  return moves[move].applies && moves[move].allowed;
}

function barredSentence({ applies, allowed, because }: MoveView): string[] {
  return applies && !allowed && because ? [because] : [];
}
