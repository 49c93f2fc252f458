import type { Transaction } from "sequelize";
import { dayIn } from "@/lib/budget/calendar";
import type { LoadedBudget } from "@/lib/budget/load-budget";
import { deputiesOn, membersAt } from "@/lib/budget/members";
import { ownersOfEdits } from "@/lib/budget/routing-facts";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { Assignment } from "@/models/assignment";
import { barredPersons } from "@/policies/independence";
import type { SigningFacts } from "@/policies/signing-rights";
import type { ProposalRecord } from "../records/proposal-record";
import type { RoundRecord } from "../records/round-record";

/** Who may sign a round at a moment: members, deputies of the day, barred persons, and the reviewer who was named. */
export async function signingFactsOf(
  proposal: ProposalRecord,
  round: RoundRecord,
  budgets: readonly { before: LoadedBudget; after: BudgetState }[],
  at: string,
  tx: Transaction,
): Promise<SigningFacts> {
  const { id: proposalId, productId, proposerId, editorIds } = proposal;
  const [first] = budgets;
  if (!first) throw new Error("Who may sign is told about a budget.");
  const owners = budgets.flatMap(({ before, after }) => ownersOfEdits(round.edits, before.state, after));
  const named = await Assignment.findOne({
    where: { proposalId, capacity: "reviewer", endedAt: null },
    transaction: tx,
  });
  return {
    members: await membersAt(productId, at, tx),
    deputies: await deputiesOn(productId, dayIn(first.before.product.timeZone, new Date(at)), tx),
    barred: barredPersons({ proposerId, editorIds: [...editorIds, round.submittedById], owners }),
    namedReviewerId: named?.userId ?? null,
  };
}
