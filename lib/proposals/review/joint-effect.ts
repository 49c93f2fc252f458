import type { Transaction } from "sequelize";
import { effectsOf } from "@/lib/evaluation/budget/effects-of";
import type { BudgetReader } from "../records/budget-reader";
import { jointChange, type JointProposal } from "./joint-change";
import { isOpen } from "../records/moves";
import { keyOf, labelOf, proposalsOf, type ProposalRecord } from "../records/proposal-record";
import { roundOf, type RoundRecord } from "../records/round-record";
import type { RoundReview } from "./round-review";
import type { JointView } from "../sheet-views";

/** Each is a computation of the budget, so a page stops here; the What-if sheet takes any set. */
const MOST_OTHERS = 20;

interface Waiting {
  proposal: ProposalRecord;
  title: string;
  joint: JointProposal;
}

/**
 * What a proposal does to today's issue together with all others that are proposed, in the order of their numbers as if
 * each were approved; null where it is decided, or where nothing else is proposed.
 */
export async function jointEffectOf(
  { proposal, round, today, people }: RoundReview,
  budgets: BudgetReader,
  tx: Transaction,
): Promise<JointView | number | null> {
  if (!isOpen(proposal.state)) return null;
  const others = (await proposalsOf(proposal.productId, tx)).filter(
    ({ id, state }) => id !== proposal.id && state === "proposed",
  );
  if (others.length > MOST_OTHERS) return others.length;
  const waiting: Waiting[] = [await waitingOne(proposal, round, budgets)];
  for (const other of others) {
    const submitted = await roundOf(other.id, other.round, tx);
    if (submitted) waiting.push(await waitingOne(other, submitted, budgets));
  }
  if (waiting.length < 2) return null;
  waiting.sort((one, other) => place(one.proposal) - place(other.proposal));

  const { steps, after } = jointChange(
    today,
    waiting.map(({ joint }) => joint),
    people,
  );
  return {
    points: effectsOf(today.results, after.results).points,
    others: waiting.flatMap(({ proposal: other, title, joint }) => {
      const step = steps.find(({ key }) => key === joint.key);
      return other.id === proposal.id || !step
        ? []
        : [{ key: joint.key, label: joint.label, title, counts: step.issue !== null, conflicts: step.conflicts }];
    }),
    conflicts: steps.find(({ key }) => key === keyOf(proposal))?.conflicts ?? [],
  };
}

async function waitingOne(proposal: ProposalRecord, round: RoundRecord, budgets: BudgetReader): Promise<Waiting> {
  const { rules, edits, transfers, title, baseIssue } = round;
  const base = await budgets.at(baseIssue);
  const joint = { key: keyOf(proposal), label: labelOf(proposal), base, rules, edits, transfers };
  return { proposal, title, joint };
}

/** A draft has no number yet: it would come last. */
function place({ number }: ProposalRecord): number {
  return number ?? Number.MAX_SAFE_INTEGER;
}
