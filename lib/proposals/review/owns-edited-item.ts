import type { Transaction } from "sequelize";
import { loadNewestBudget } from "@/lib/budget/load-budget";
import type { RoundRecord } from "../records/round-record";

/** Whether somebody owns an item that a round edits, before or after: that is a part in the proposal. */
export async function ownsEditedItem(
  userId: number,
  productId: number,
  { edits }: Pick<RoundRecord, "edits">,
  tx: Transaction,
): Promise<boolean> {
  const { state } = await loadNewestBudget(productId, tx);
  return edits.some(({ kind, number, body }) => {
    if (kind !== "item") return false;
    const line = state.lines.find((each) => each.kind === "item" && each.number === number);
    return body?.ownerId === userId || (line?.kind === "item" && line.body.ownerId === userId);
  });
}
