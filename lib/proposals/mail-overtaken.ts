import type { ProposalAct } from "./act-on-proposal";
import { budgetReader } from "./budget-reader";
import { editorsOf, mailFacts, mailMany } from "./mails";
import { overtakenReasons } from "./overtaken";
import { proposalsOf } from "./proposal-record";
import { roundOf } from "./round-record";

/** Tells the editors of other open proposals that the issue just made went past theirs. */
export async function mailOvertaken({ tx, at, proposal: approved }: ProposalAct, issue: number): Promise<void> {
  const budgets = budgetReader(approved.productId, tx);
  const open = (await proposalsOf(approved.productId, tx)).filter(
    ({ id, state }) => state === "proposed" && id !== approved.id,
  );
  for (const proposal of open) {
    const round = await roundOf(proposal.id, proposal.round, tx);
    if (!round) continue;
    const base = await budgets.at(round.baseIssue);
    const because = overtakenReasons(base.state, (await budgets.at(issue)).state, round.edits);
    if (because.length === 0) continue;
    await mailMany(
      { tx, at, proposal },
      {
        template: "overtaken",
        occasion: `overtaken in round ${proposal.round}`,
        to: editorsOf(proposal),
        except: null,
        data: { ...mailFacts(proposal), because },
      },
    );
  }
}
