import { loadNewestBudget, productByCode } from "@/lib/budget/load-budget";
import type { LineState } from "@/lib/evaluation/lines/line-state";
import { budgetReader } from "@/lib/proposals/records/budget-reader";
import { proposalById } from "@/lib/proposals/records/proposal-record";
import { roundOf } from "@/lib/proposals/records/round-record";
import { reviewRound } from "@/lib/proposals/review/round-review";
import type { Clock } from "@/lib/vocabulary/clock";
import type { LineKind } from "@/lib/vocabulary/lines";
import { inSnapshot } from "@/models/database";

/** What a signer has before them, by its hashes. */
export function shownSheet(proposalId: number, clock: Clock): Promise<{ roundHash: string; textHash: string }> {
  return inSnapshot(async (tx) => {
    const proposal = await proposalById(proposalId, tx);
    const round = await roundOf(proposalId, proposal.round, tx);
    if (!round) throw new Error("A proposal without a round has no sheet to sign.");
    const at = clock().toISOString();
    const { textHash } = await reviewRound(proposal, round, budgetReader(proposal.productId, tx), { at, tx });
    return { roundHash: round.hash, textHash };
  });
}

/** The working copy's version that a form was filled from. */
export function lockVersionOf(proposalId: number): Promise<number> {
  return inSnapshot(async (tx) => (await proposalById(proposalId, tx)).lockVersion);
}

/** A line as it stands at the newest issue. */
export function standingLine(productCode: string, kind: LineKind, number: string): Promise<LineState> {
  return inSnapshot(async (tx) => {
    const { id } = await productByCode(productCode, tx);
    const { state } = await loadNewestBudget(id, tx);
    const line = state.lines.find((candidate) => candidate.kind === kind && candidate.number === number);
    if (!line) throw new Error(`${productCode} has no ${kind} ${number}`);
    return line;
  });
}
