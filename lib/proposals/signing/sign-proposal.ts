import { passwordRefusal } from "@/lib/users/password-refusal";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import type { ProposalState } from "@/lib/vocabulary/proposals";
import { Refusal } from "@/lib/vocabulary/refusal";
import { actOnProposal, type ProposalAct } from "../records/act-on-proposal";
import { approveRound } from "./approve-round";
import { demandApprovable } from "./demand-approvable";
import { noteLeftPlannedBand } from "../notices/left-planned-band";
import { openRound } from "../submitting/open-round";
import { mailDownstream } from "../notices/mail-downstream";
import { mailApproved, mailDecided, mailSigned } from "../notices/mails";
import { mailOthers } from "../notices/mail-others";
import { isFilled, type RoundReview } from "../review/round-review";
import type { SignProposalInput } from "../schema";
import { endProposal } from "../submitting/end-proposal";
import { writeSignature } from "./write-signature";

export interface SignedProposal {
  state: ProposalState;
  /** The issue that this signature made; null where others have still to sign. */
  issue: number | null;
}

/**
 * Approves or disapproves a round in one capacity, with a password. The approval that completes the routing makes the
 * next issue in the same transaction: all of it happens or nothing.
 */
export async function signProposal(
  actor: Actor,
  { password, ...sheet }: SignProposalInput,
  clock: Clock = systemClock,
): Promise<SignedProposal> {
  return signSheet(actor, sheet, await passwordRefusal(actor.userId, password), clock);
}

export type SheetToSign = Omit<Approval, "password"> | Omit<Disapproval, "password">;

/** One sheet, with what was found before to stand against it, if anything: a wrong password, a sheet not opened. */
export function signSheet(
  actor: Actor,
  sheet: SheetToSign,
  objection: Refusal | null,
  clock: Clock,
): Promise<SignedProposal> {
  const act = sheet.decision === "approve" ? "approve_proposal" : "disapprove_proposal";
  return actOnProposal(actor, clock, { act, proposalId: sheet.proposalId }, async (context) => {
    const review = await openRound(actor, context, sheet);
    if (objection) throw objection;
    if (sheet.roundHash !== review.round.hash) throw moved("A newer round was submitted in the meantime.");
    return sheet.decision === "approve"
      ? approve(actor, context, review, sheet)
      : disapprove(actor, context, review, sheet);
  });
}

type Approval = Extract<SignProposalInput, { decision: "approve" }>;
type Disapproval = Extract<SignProposalInput, { decision: "disapprove" }>;

async function approve(
  actor: Actor,
  context: ProposalAct,
  review: RoundReview,
  { capacity, meaning, deputyForId, textHash }: Omit<Approval, "password">,
): Promise<SignedProposal> {
  const { tx, at, record } = context;
  await demandApprovable(actor, review, { capacity, deputyForId }, tx);
  if (textHash !== review.textHash) throw moved("The effect on today's issue or what has to be signed moved.");

  const words = { decision: "approve", capacity, meaning, reason: null, deputyForId, takesBackId: null } as const;
  const signature = await writeSignature(actor, review, words, at, tx);
  const approvals = [...review.approvals, { capacity }];
  const missing = review.required.filter((required) => !isFilled(required, approvals, review.round));
  const { hash, deputyForName: deputyFor } = signature;
  const signed = { round: review.round.number, signature: hash, meaning, ...(deputyFor ? { deputyFor } : {}) };
  if (missing.length > 0) {
    record({ capacity, now: signed });
    await mailSigned(actor, context, { capacity, signatureId: signature.id, missing });
    return { state: "proposed", issue: null };
  }
  const issue = await approveRound(context, review);
  record({
    capacity,
    was: { state: "proposed", issue: review.today.issue },
    now: { ...signed, state: "approved", issue: issue.number, contentHash: issue.contentHash },
  });
  await mailApproved(actor, context, { issue: issue.number, approvals: review.approvals });
  const { after, changedLines } = review.onToday.change;
  const changedItems = changedLines.filter(({ kind }) => kind === "item").map(({ number }) => number);
  await mailDownstream(context, { issue: issue.number, state: after.state, changedItems });
  await noteLeftPlannedBand(context, review, issue);
  await mailOthers(context);
  return { state: "approved", issue: issue.number };
}

async function disapprove(
  actor: Actor,
  context: ProposalAct,
  review: RoundReview,
  { capacity, reason, deputyForId, textHash }: Omit<Disapproval, "password">,
): Promise<SignedProposal> {
  const { tx, at, record } = context;
  if (textHash !== review.textHash) throw moved("The effect on today's issue or what has to be signed moved.");
  const words = { decision: "disapprove", capacity, meaning: null, reason, deputyForId, takesBackId: null } as const;
  const signature = await writeSignature(actor, review, words, at, tx);
  await endProposal(context, "disapprove");
  const { hash, deputyForName: deputyFor } = signature;
  const standing = { state: "disapproved", round: review.round.number, signature: hash };
  const now = { ...standing, ...(deputyFor ? { deputyFor } : {}) };
  record({ capacity, was: { state: "proposed" }, now, reason });
  await mailDecided(actor, context, "disapproved");
  return { state: "disapproved", issue: null };
}

function moved(what: string): Refusal {
  return new Refusal("moved", `${what} Read the sheet again before you sign it.`);
}
