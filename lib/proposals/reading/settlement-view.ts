import type { Transaction } from "sequelize";
import { previewChange } from "@/lib/evaluation/budget/preview-change";
import type { BudgetReader } from "../records/budget-reader";
import type { ProposalRecord } from "../records/proposal-record";
import { carriedEdits, settledEdit, settlementNames, settlementRow } from "../review/settlement";
import type { SettlementRow, SettlementView } from "../workspace-views";
import { storedChange } from "../records/working-copy";

/** The working copy against the newest issue: what carries by itself, and a row for each field that both changed. */
export async function settlementViewOf(
  proposal: ProposalRecord,
  people: ReadonlyMap<number, string>,
  { budgets, tx }: { budgets: BudgetReader; tx: Transaction },
): Promise<SettlementView> {
  const [base, onto] = [await budgets.at(proposal.baseIssue), await budgets.newest()];
  const { edits, transfers } = await storedChange({ proposalId: proposal.id }, tx);
  const carried = carriedEdits(base.state, onto.state, edits);
  const names = settlementNames(base.state, onto.state, people);
  const conflicts: SettlementRow[] = [];
  const carriedRows: SettlementView["carried"] = [];
  for (const each of carried) {
    for (const merge of each.merges) {
      const row = settlementRow(each, merge, names);
      if (merge.side === "conflict") conflicts.push(row);
      else if (merge.side === "theirs" || merge.side === "yours") carriedRows.push({ ...row, side: merge.side });
    }
  }
  const settled = carried.map((each) => settledEdit(each, new Map(each.merges.map(({ field }) => [field, "yours"]))));
  const { effects } = previewChange(onto.state, onto.results, settled, transfers);
  return {
    proposalId: proposal.id,
    lockVersion: proposal.lockVersion,
    baseIssue: base.issue,
    ontoIssue: onto.issue,
    conflicts,
    carried: carriedRows,
    obstacles: carried.flatMap(({ obstacle }) => obstacle ?? []),
    predictedDelta: effects.points.flatMap(({ operatingPoint, predictedDelta, now }) =>
      now === null ? [] : [{ operatingPoint, delta: predictedDelta, standingNow: now.standing }],
    ),
  };
}
