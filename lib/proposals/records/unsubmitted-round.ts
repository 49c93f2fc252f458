import type { Transaction } from "sequelize";
import { membersAt } from "@/lib/budget/members";
import { termsOf } from "@/lib/evaluation/budget/indexed-state";
import type { BudgetReader } from "./budget-reader";
import type { ProposalRecord } from "./proposal-record";
import type { RoundRecord } from "./round-record";
import { storedChange } from "./working-copy";

/** The working copy looked at as the round that it would become if its proposer submitted it now. */
export async function unsubmittedRound(
  proposal: ProposalRecord,
  budgets: BudgetReader,
  at: string,
  tx: Transaction,
): Promise<RoundRecord> {
  const { title, reason, neededBy, baseIssue, proposerId } = proposal;
  const { state } = await budgets.at(baseIssue);
  const members = await membersAt(proposal.productId, at, tx);
  return {
    ...{ id: 0, number: 0, baseIssue, title, reason, neededBy, hash: "" },
    rules: termsOf(state).reviewRules,
    submittedById: proposerId,
    submittedAt: at,
    isSubmittedByManager: members.some(
      ({ userId, roles }) => userId === proposerId && roles.includes("program_manager"),
    ),
    ...(await storedChange({ proposalId: proposal.id }, tx)),
  };
}
