import { canonicalJson } from "@/lib/audit/canonical-json";
import type { LoadedBudget } from "@/lib/budget/load-budget";
import type { ReviewRules } from "@/lib/vocabulary/review-rules";
import type { DraftEdit, DraftTransfer } from "../schema";

export interface RoundToSubmit {
  label: string;
  number: number;
  title: string;
  reason: string;
  neededBy: string | null;
  edits: readonly DraftEdit[];
  transfers: readonly DraftTransfer[];
  base: LoadedBudget;
  rules: ReviewRules;
}

/** What a round's hash covers: edits with their base revisions, results of the edited items at the base issue, rules. */
export function roundText({ base, edits, ...round }: RoundToSubmit): string {
  const baseLine = ({ kind, number }: DraftEdit) => {
    const line = base.state.lines.find((each) => each.kind === kind && each.number === number);
    return line ? { letter: line.letter, issue: line.issue, retired: line.retired, body: line.body } : null;
  };
  const items = edits.filter(({ kind }) => kind === "item").map(({ number }) => number);
  return canonicalJson({
    proposal: round.label,
    round: round.number,
    baseIssue: base.issue,
    title: round.title,
    reason: round.reason,
    neededBy: round.neededBy,
    edits: edits.map((edit) => ({ ...edit, base: baseLine(edit) })),
    transfers: round.transfers,
    results: base.results.points.map(({ operatingPoint, items: results }) => ({
      operatingPoint,
      items: results
        .filter(({ item }) => items.includes(item))
        .map(({ item, methodVersion, basic, growthFraction, growth, predicted }) => ({
          ...{ item, methodVersion, basic, growthFraction, growth, predicted },
        })),
    })),
    rules: round.rules,
  });
}
