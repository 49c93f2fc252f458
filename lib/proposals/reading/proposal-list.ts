import type { Transaction } from "sequelize";
import type { LoadedBudget } from "@/lib/budget/load-budget";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { lineName } from "@/lib/evaluation/lines/name-book";
import type { Actor } from "@/lib/vocabulary/actor";
import { isAllowed } from "@/policies/authorize";
import type { BudgetReader } from "../records/budget-reader";
import { unsettledRequests } from "../signing/demand-approvable";
import { canMove, isOpen } from "../records/moves";
import { keyOf, labelOf, proposalQuestion, proposalsOf, type ProposalRecord } from "../records/proposal-record";
import { roundsOf, type RoundRecord } from "../records/round-record";
import { reviewRound, type RoundReview } from "../review/round-review";
import { routingView } from "./routing-views";
import { storedChange } from "../records/working-copy";
import type { ProposalListRow } from "../workspace-views";

/** A proposal with its current round, judged on today's issue where it is open. */
export interface ListedProposal {
  proposal: ProposalRecord;
  round: RoundRecord | null;
  review: RoundReview | null;
  row: ProposalListRow;
}

interface Listing {
  at: string;
  budgets: BudgetReader;
  tx: Transaction;
  /** Leaves out what has come to its end. */
  onlyOpen?: boolean;
}

/** What the reader may see of a product's proposals, newest first. */
export async function listedProposals(
  actor: Actor,
  productId: number,
  people: ReadonlyMap<number, string>,
  { at, budgets, tx, onlyOpen = false }: Listing,
): Promise<ListedProposal[]> {
  const visible = (await proposalsOf(productId, tx)).filter(
    (proposal) => (!onlyOpen || isOpen(proposal.state)) && isAllowed(actor, proposalQuestion(proposal, actor, "read")),
  );
  const listed: ListedProposal[] = [];
  for (const proposal of visible.reverse()) {
    const rounds = await roundsOf(proposal.id, tx);
    const round = rounds.at(-1) ?? null;
    const isJudged = round !== null && isOpen(proposal.state);
    const review = isJudged ? await reviewRound(proposal, round, budgets, { at, tx }) : null;
    const row = await listRow({ proposal, rounds, review, people, newest: await budgets.newest() }, tx);
    listed.push({ proposal, round, review, row });
  }
  return listed;
}

interface RowSource {
  proposal: ProposalRecord;
  rounds: readonly RoundRecord[];
  review: RoundReview | null;
  people: ReadonlyMap<number, string>;
  newest: LoadedBudget;
}

async function listRow(
  { proposal, rounds, review, people, newest }: RowSource,
  tx: Transaction,
): Promise<ProposalListRow> {
  const { id: proposalId, number, state, round, baseIssue, proposerId, endedAt } = proposal;
  const shown = rounds.at(-1) ?? proposal;
  const edits = rounds.at(-1)?.edits ?? (await storedChange({ proposalId }, tx)).edits;
  return {
    ...{ proposalId, number, state, round, baseIssue, title: shown.title, neededBy: shown.neededBy },
    key: keyOf(proposal),
    label: labelOf(proposal),
    proposer: { id: proposerId, name: people.get(proposerId) ?? "" },
    proposedAt: rounds.at(-1)?.submittedAt ?? null,
    decidedAt: endedAt,
    lines: edits.map(({ kind, number: line, body }) => ({
      kind,
      number: line,
      name: nameIn(newest.state, kind, line) ?? (typeof body?.name === "string" ? body.name : ""),
    })),
    effect: review && effectOf(review),
    waitingFor: review && canMove(state, "approve") ? waitingFor(review) : [],
    overtaken: review?.overtaken ?? [],
    unsettledRequests: (await unsettledRequests(proposalId, tx)).length,
  };
}

function nameIn(state: BudgetState, kind: string, number: string): string | null {
  const line = state.lines.find((each) => each.kind === kind && each.number === number);
  return line ? lineName(line) : null;
}

function effectOf({ onToday }: RoundReview): ProposalListRow["effect"] {
  const { effects, after } = onToday.change;
  const worst = effects.points.find(({ operatingPoint }) => operatingPoint === after.results.worstPoint);
  if (!worst?.now) return null;
  const { operatingPoint, predictedDelta, was, now } = worst;
  return { operatingPoint, predictedDelta, standingWas: (was ?? now).standing, standingNow: now.standing };
}

/** Capacities that are still to be signed, with those who may. */
export function waitingFor(review: RoundReview): ProposalListRow["waitingFor"] {
  return routingView(review)
    .capacities.filter(({ capacity, filledBy }) => filledBy === null && !isSubmitted(capacity, review))
    .map(({ capacity, maySign, missing }) => ({
      capacity,
      names: missing === null ? maySign.map(({ name }) => name) : [],
    }));
}

function isSubmitted(capacity: string, { required, round }: RoundReview): boolean {
  return round.isSubmittedByManager && required.some((each) => each.capacity === capacity && each.signedBySubmitting);
}
