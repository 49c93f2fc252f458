import type { ProposalAct } from "../records/act-on-proposal";
import { budgetReader } from "../records/budget-reader";
import { editorsOf, mailFacts, mailMany, mailProposed } from "./mails";
import { proposalsOf } from "../records/proposal-record";
import { roundOf } from "../records/round-record";
import { reviewRound } from "../review/round-review";

/**
 * What the issue just made does to other open proposals: the editors of an overtaken one are told, and where routing
 * grew, those who are asked for the first time.
 */
export async function mailOthers({ tx, at, proposal: approved }: ProposalAct): Promise<void> {
  const budgets = budgetReader(approved.productId, tx);
  const open = (await proposalsOf(approved.productId, tx)).filter(
    ({ id, state }) => state === "proposed" && id !== approved.id,
  );
  for (const proposal of open) {
    const round = await roundOf(proposal.id, proposal.round, tx);
    if (!round) continue;
    const context = { tx, at, proposal };
    const { overtaken, routing } = await reviewRound(proposal, round, budgets, { at, tx });
    if (overtaken.length === 0) {
      await mailProposed(null, context, { routing, round });
      continue;
    }
    await mailMany(context, {
      template: "overtaken",
      occasion: `overtaken in round ${proposal.round}`,
      to: editorsOf(proposal),
      except: null,
      data: { ...mailFacts(proposal), because: overtaken },
    });
  }
}
