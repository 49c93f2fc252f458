import { changePatch } from "@/lib/budget/line-diff";
import { canonicalLineText } from "@/lib/evaluation/lines/canonical-line-text";
import { LINE_KIND_NAMES } from "@/lib/vocabulary/lines";
import { lineChanges } from "../review/line-changes";
import type { RoundReview } from "../review/round-review";

/** The change as a unified patch over the canonical texts of its lines, from the base issue to what was asked for. */
export function patchOf({ round, base, onBase, people }: RoundReview): string {
  const { after, changedLines } = onBase.change;
  return changePatch(
    lineChanges(round.edits, base.state, after.state, changedLines, people).map((change) => ({
      name: `${LINE_KIND_NAMES[change.kind].toLowerCase()} ${change.number}`,
      letterBefore: change.letterWas,
      letterAfter: change.letterNow,
      before: change.before === null ? "" : canonicalLineText(change.before, change.namesBefore),
      after: canonicalLineText(change.after, change.namesAfter),
    })),
  );
}
