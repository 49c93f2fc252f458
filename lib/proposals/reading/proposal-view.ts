import type { Transaction } from "sequelize";
import type { Actor } from "@/lib/vocabulary/actor";
import { ROLE_NAMES } from "@/lib/vocabulary/roles";
import { Assignment } from "@/models/assignment";
import { Issue } from "@/models/issue";
import type { BudgetReader } from "../records/budget-reader";
import { comparedText } from "../review/compared-text";
import { unsettledRequests } from "../signing/demand-approvable";
import { effectView } from "../review/effect-views";
import { evidenceViewOf } from "./evidence-views";
import { jointEffectOf } from "../review/joint-effect";
import { lineViews } from "../review/line-views";
import { isOpen } from "../records/moves";
import { deputyRights, moveViews } from "./move-views";
import { ownsEditedItem } from "../review/owns-edited-item";
import { keyOf, labelOf, type ProposalRecord } from "../records/proposal-record";
import { objectionViews, remarkViews } from "./remark-views";
import { roundsOf, type RoundRecord } from "../records/round-record";
import { reviewRound, type RoundReview } from "../review/round-review";
import { personOf, routingView, signatureViews } from "./routing-views";
import { holderName } from "../review/transfer-text";
import { unsubmittedRound } from "../records/unsubmitted-round";
import type { PersonView, ProposalView, RoundView, TransferView } from "../views";

interface Reading {
  at: string;
  budgets: BudgetReader;
  tx: Transaction;
}

/** A proposal for one reader: one of its rounds (the current one unless asked for), or the draft. */
export async function proposalViewOf(
  actor: Actor,
  proposal: ProposalRecord,
  roundNumber: number | undefined,
  { at, budgets, tx }: Reading,
): Promise<ProposalView | null> {
  const rounds = await roundsOf(proposal.id, tx);
  const shown = roundNumber ?? proposal.round;
  const submitted = rounds.find(({ number }) => number === shown);
  if (!submitted && (roundNumber !== undefined || proposal.round > 0)) return null;
  const round = submitted ?? (await unsubmittedRound(proposal, budgets, at, tx));

  const madeIssue = await approvedAsIssue(proposal, tx);
  const isCurrent = round.number === proposal.round;
  const onIssue = isCurrent && isOpen(proposal.state) ? undefined : judgedOn(round, isCurrent ? madeIssue : null);
  const review = await reviewRound(proposal, round, budgets, { at, tx, ...(onIssue === undefined ? {} : { onIssue }) });
  const newest = await budgets.newest();
  const roundNumbers = new Map(rounds.map(({ id, number }) => [id, number]));
  const isOwner = await ownsEditedItem(actor.userId, proposal.productId, round, tx);
  const state = review.onToday.change.after.state;
  const remarks = await remarkViews(
    { actor, proposal, isOwner, state, rounds, shown: round, people: review.people },
    tx,
  );
  const asOf = isCurrent ? review : { ...review, proposal: { ...proposal, state: "withdrawn" as const } };
  return {
    ...facts(proposal, round, review),
    newestIssue: newest.issue,
    round: submitted ? roundView(submitted, review) : null,
    rounds: rounds.map((each) => roundView(each, review)),
    approvedAsIssue: madeIssue,
    ...changeShown(review, remarks),
    evidence: await evidenceViewOf(actor, review, tx),
    effectToday: onIssue === undefined || madeIssue !== null ? effectOn(review) : null,
    jointly: isCurrent ? await jointEffectOf(review, budgets, tx) : null,
    comparedReason: comparedText(reasonBefore(rounds, round), round.reason),
    namedBecause: await whyNamed(proposal.id, tx),
    objections: await objectionViews(proposal, roundNumbers, tx),
    remarks,
    addressable: addressable(actor, review),
    moves: moveViews(actor, asOf, await unsettledRequests(proposal.id, tx)),
    signingSheet:
      submitted && isCurrent ? { text: review.text, textHash: review.textHash, roundHash: round.hash } : null,
    deputyFor: deputyRights(actor, review).flatMap(({ capacity, deputyFor }) =>
      deputyFor ? [{ capacity, person: { id: deputyFor.userId, name: deputyFor.printedName } }] : [],
    ),
  };
}

function addressable({ userId: reader }: Actor, { signing }: RoundReview): PersonView[] {
  return signing.members.flatMap(({ userId, printedName }) =>
    userId === reader ? [] : [{ id: userId, name: printedName }],
  );
}

function reasonBefore(rounds: readonly RoundRecord[], { number }: RoundRecord): string | null {
  return rounds.find((round) => round.number === number - 1)?.reason ?? null;
}

function facts(proposal: ProposalRecord, round: RoundRecord, { today, people }: RoundReview) {
  const { productId: id, productCode: code, productName: name, state, lockVersion, number } = proposal;
  return {
    product: { id, code, name, kind: today.product.kind },
    proposalId: proposal.id,
    key: keyOf(proposal),
    label: labelOf(proposal),
    ...{ number, state, lockVersion, title: round.title, reason: round.reason, neededBy: round.neededBy },
    proposer: personOf(people, proposal.proposerId),
    coEditors: proposal.coEditorIds.map((userId) => personOf(people, userId)),
  };
}

/** Lines are shown against today's issue, or against the base where it was overtaken since. */
function changeShown(review: RoundReview, remarks: ProposalView["remarks"]) {
  const { round, base, today, onBase, onToday, overtaken, obstacles, people } = review;
  const [on, preview] = overtaken.length > 0 ? [base, onBase] : [today, onToday];
  const missing = review.routing.find((capacity) => capacity.missing !== null);
  const blocked = obstacles[0] ?? (missing ? `${ROLE_NAMES[missing.capacity]}: ${missing.missing}` : null);
  return {
    lines: lineViews({ edits: round.edits, on, preview, base, today, remarks, people }),
    transfers: transferViews(review),
    effectOnBase: effectView({ before: base, ...onBase.change, edits: round.edits }),
    faults: preview.obstacles.map(({ path, sentence }) => ({ path, sentence })),
    blocked: isOpen(review.proposal.state) ? blocked : null,
    overtaken: isOpen(review.proposal.state) ? overtaken : [],
    voidedEvidence: review.voidedEvidence,
    routing: routingView(review),
    signatures: signatureViews(review),
  };
}

function effectOn({ today, onToday, round }: RoundReview) {
  return effectView({ before: today, ...onToday.change, edits: round.edits });
}

function transferViews({ round, onToday }: RoundReview): TransferView[] {
  const { state } = onToday.change.after;
  return round.transfers.map(({ giver, receiver, hundredths }) => ({
    giver: { ...giver, name: holderName(giver, state) },
    receiver: { ...receiver, name: holderName(receiver, state) },
    hundredths,
  }));
}

function roundView(
  { number, baseIssue, submittedAt, submittedById, hash }: RoundRecord,
  { people }: RoundReview,
): RoundView {
  return { round: number, baseIssue, submittedAt, submittedBy: personOf(people, submittedById), hash };
}

/** What was decided is shown on the issue that it was applied to; anything else that ended on its base. */
function judgedOn(round: RoundRecord, madeIssue: number | null): number {
  return madeIssue === null ? round.baseIssue : madeIssue - 1;
}

async function approvedAsIssue({ id, state }: ProposalRecord, tx: Transaction): Promise<number | null> {
  if (state !== "approved") return null;
  const issue = await Issue.findOne({ where: { proposalId: id }, transaction: tx });
  return issue?.number ?? null;
}

async function whyNamed(proposalId: number, tx: Transaction): Promise<string | null> {
  const named = await Assignment.findOne({
    where: { proposalId, capacity: "reviewer", endedAt: null },
    transaction: tx,
  });
  return named?.reason ?? null;
}
