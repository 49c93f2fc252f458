import { issueFactsOf } from "@/lib/budget/issue-facts";
import { newestIssue } from "@/lib/budget/load-budget";
import type { BudgetAt } from "@/lib/budget/views";
import { allocationsView } from "@/lib/evaluation/budget/allocations-view";
import type { Actor } from "@/lib/vocabulary/actor";
import { authorize } from "@/policies/authorize";
import { budgetReader } from "../records/budget-reader";
import { isOpen } from "../records/moves";
import { previewProposal } from "../review/preview-proposal";
import { peopleOf, reading } from "../records/product-reading";
import { proposalByKey, proposalQuestion } from "../records/proposal-record";
import { roundOf } from "../records/round-record";

/**
 * Today's budget as it would be with the round that is open to signers, so that they can follow its figures step by
 * step; null where no round is open.
 */
export function budgetWith(actor: Actor, productCode: string, key: string): Promise<BudgetAt | null> {
  return reading(actor, productCode, async ({ product, tx }) => {
    const proposal = await proposalByKey(product.id, key, tx);
    if (!proposal) return null;
    authorize(actor, proposalQuestion(proposal, actor, "read"));
    const round = await roundOf(proposal.id, proposal.round, tx);
    if (!isOpen(proposal.state) || !round) return null;

    const today = await budgetReader(product.id, tx).newest();
    // Who has to sign it is told elsewhere: only the figures are asked for.
    const nobody = { rules: round.rules, earlierMoves: [], isSubmittedByManager: false };
    const { state, results } = previewProposal(today, round, nobody).change.after;
    const issue = (await issueFactsOf(product, tx)).find(({ number }) => number === today.issue);
    if (!issue) throw new Error(`Issue ${today.issue} of ${productCode} tells nothing of itself.`);
    const people = [...(await peopleOf(product.id, tx))].map(([id, name]) => ({ id, name }));
    return {
      ...{ issue, state, results, people, uncertainty: null, allocations: allocationsView(state, results) },
      product: { ...product, newestIssue: await newestIssue(product.id, tx) },
    };
  });
}
