import { writeIssue, type WrittenIssue } from "@/lib/budget/write-issue";
import type { ProposalAct } from "../records/act-on-proposal";
import { endProposal } from "../submitting/end-proposal";
import type { RoundReview } from "../review/round-review";

/** The last signature was given: the next issue, with every revision and every result that changed. */
export async function approveRound(context: ProposalAct, review: RoundReview): Promise<WrittenIssue> {
  const { today, onToday, proposal } = review;
  const issue = await writeIssue(
    {
      product: today.product,
      proposalId: proposal.id,
      at: context.at,
      changedLines: onToday.change.changedLines,
      state: onToday.change.after.state,
      resultsBefore: today.results,
      results: onToday.change.after.results,
    },
    context.tx,
  );
  await endProposal(context, "approve");
  return issue;
}
