import type { Transaction } from "sequelize";
import { textHash } from "@/lib/audit/text-hash";
import { approvedMoves } from "@/lib/budget/approved-moves";
import type { LoadedBudget } from "@/lib/budget/load-budget";
import { namesOf } from "@/lib/budget/members";
import type { Capacity } from "@/lib/vocabulary/roles";
import { grownRouting, routeCapacities, type RequiredCapacity, type RoutedCapacity } from "@/policies/approval-routing";
import type { SigningFacts } from "@/policies/signing-rights";
import type { BudgetReader } from "../records/budget-reader";
import { canonicalRows, lineChanges, lineTitle } from "./line-changes";
import { overtakenReasons } from "./overtaken";
import { previewProposal, type ProposalPreview } from "./preview-proposal";
import { labelOf, type ProposalRecord } from "../records/proposal-record";
import type { RoundRecord } from "../records/round-record";
import { signaturesOf, standingApprovals, type SignatureRecord } from "../records/signature-records";
import { signingFactsOf } from "./signing-facts";
import { routingOfText, signingText } from "./signing-text";
import { transferText } from "./transfer-text";
import { voidedCitations } from "../records/voided-citations";

/** A round beside its base and beside an issue that it is judged on: everything a page shows and a signature binds. */
export interface RoundReview {
  proposal: ProposalRecord;
  round: RoundRecord;
  base: LoadedBudget;
  today: LoadedBudget;
  onBase: ProposalPreview;
  onToday: ProposalPreview;
  overtaken: string[];
  /** Why today's issue cannot take it, as sentences. */
  obstacles: string[];
  required: RequiredCapacity[];
  routing: RoutedCapacity[];
  signing: SigningFacts;
  signatures: SignatureRecord[];
  approvals: SignatureRecord[];
  people: ReadonlyMap<number, string>;
  /** Files that the round cites and that were voided, a sentence each. */
  voidedEvidence: string[];
  /** The text that a signature would stand under now. */
  text: string;
  textHash: string;
}

export async function reviewRound(
  proposal: ProposalRecord,
  round: RoundRecord,
  budgets: BudgetReader,
  { at, onIssue, tx }: { at: string; onIssue?: number; tx: Transaction },
): Promise<RoundReview> {
  const base = await budgets.at(round.baseIssue);
  const today = onIssue === undefined ? await budgets.newest() : await budgets.at(onIssue);
  const onBase = await previewOn(base, round, round.submittedAt, tx);
  const onToday = today.issue === base.issue ? onBase : await previewOn(today, round, at, tx);
  const signatures = await signaturesOf(proposal.id, tx);
  const sides = [
    { before: base, after: onBase.change.after.state },
    { before: today, after: onToday.change.after.state },
  ];
  const signing = await signingFactsOf(proposal, round, sides, at, tx);
  const required = grownBy(onBase.routing, signatures, round, onToday.routing);
  const people = new Map((await namesOf(proposal.productId, tx)).map(({ id, name }) => [id, name]));
  const obstacles = onToday.obstacles.map(({ sentence }) => sentence);
  const voidedEvidence = await voidedCitations(proposal.productId, round.edits, tx);
  const text = sheetText(proposal, round, { today, onToday, obstacles, required, people, voidedEvidence });
  return {
    ...{ proposal, round, base, today, onBase, onToday, obstacles, required, signing, signatures, people, text },
    voidedEvidence,
    overtaken: overtakenReasons(base.state, today.state, round.edits),
    routing: routeCapacities(required, signing),
    approvals: standingApprovals(signatures, round.id),
    textHash: textHash("signature", text),
  };
}

/** Whether a capacity has all the approvals that it asks for. */
export function isFilled(
  { capacity, count, signedBySubmitting }: RequiredCapacity,
  approvals: readonly { capacity: Capacity }[],
  round: RoundRecord,
): boolean {
  if (signedBySubmitting && round.isSubmittedByManager) return true;
  return approvals.filter((approval) => approval.capacity === capacity).length >= count;
}

async function previewOn(
  budget: LoadedBudget,
  round: RoundRecord,
  at: string,
  tx: Transaction,
): Promise<ProposalPreview> {
  const moves = await approvedMoves(budget.product.id, at, round.rules.programManagerOn.windowDays, tx);
  return previewProposal(budget, round, {
    rules: round.rules,
    earlierMoves: moves.filter(({ issue }) => issue <= budget.issue),
    isSubmittedByManager: round.isSubmittedByManager,
  });
}

/** What the submission and every signature of the round saw asked for stays asked for. */
function grownBy(
  atSubmission: readonly RequiredCapacity[],
  signatures: readonly SignatureRecord[],
  round: RoundRecord,
  now: readonly RequiredCapacity[],
): RequiredCapacity[] {
  const seen = signatures
    .filter(({ roundId }) => roundId === round.id)
    .map((each) => routingOfText(each.canonicalText));
  return [...seen, [...now]].reduce((grown, each) => grownRouting(grown, each), [...atSubmission]);
}

function sheetText(
  proposal: ProposalRecord,
  round: RoundRecord,
  shown: Pick<RoundReview, "today" | "onToday" | "obstacles" | "required" | "people" | "voidedEvidence">,
): string {
  const { state: after } = shown.onToday.change.after;
  const changes = lineChanges(round.edits, shown.today.state, after, shown.onToday.change.changedLines, shown.people);
  return signingText({
    label: labelOf(proposal),
    title: round.title,
    round: round.number,
    roundHash: round.hash,
    lines: changes.map((change) => ({ ...change, title: lineTitle(change), rows: canonicalRows(change) })),
    transfers: round.transfers.map((transfer) => transferText(transfer, after)),
    voidedEvidence: shown.voidedEvidence,
    onIssue: shown.today.issue,
    effects: shown.onToday.change.effects,
    obstacles: shown.obstacles,
    routing: shown.required,
  });
}
