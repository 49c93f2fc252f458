import type { LineEdit } from "@/lib/evaluation/budget/edits";
import type { Effects } from "@/lib/evaluation/budget/effects";
import type { BudgetResults } from "@/lib/evaluation/budget/results";
import type { BudgetState, LineState } from "@/lib/evaluation/lines/line-state";
import type { NoteCode } from "@/lib/evaluation/notes/note-code";
import type { MaturityGrade } from "@/lib/vocabulary/grades";
import type { LineKind } from "@/lib/vocabulary/lines";
import type { ReviewRules } from "@/lib/vocabulary/review-rules";
import type {
  EarlierMove,
  GrowthRelease,
  RangeCaution,
  RoutingEdit,
  RoutingFacts,
  RoutingPoint,
} from "@/policies/routing-facts";
import { sameValue } from "./same-value";

/** Notes that say a method is used outside the range it is stated for. */
const RANGE_CAUTIONS: readonly NoteCode[] = ["reynolds-outside-line-range", "roughness-ratio-outside-range"];

/** A change with its state and results on both sides. */
export interface ComputedChange {
  edits: readonly LineEdit[];
  transfers: readonly unknown[];
  before: BudgetState;
  after: BudgetState;
  changedLines: readonly LineState[];
  resultsBefore: BudgetResults;
  resultsAfter: BudgetResults;
  effects: Effects;
}

/** What routing has to know of a change, in its own plain words. */
export function routingFactsOf(
  change: ComputedChange,
  rules: ReviewRules,
  earlierMoves: readonly EarlierMove[],
): RoutingFacts {
  return {
    rules,
    edits: change.edits.map((edit) => routingEdit(edit, change)),
    transfers: change.transfers.length,
    movesAllocations: change.changedLines.some(({ kind }) => kind === "allocations"),
    points: routingPoints(change.effects),
    releases: growthReleases(change),
    newRangeCautions: newRangeCautions(change.effects),
    earlierMoves,
  };
}

/** The review rules that stand in the terms of a budget. */
export function reviewRulesOf(state: BudgetState): ReviewRules {
  const terms = state.lines.find((line) => line.kind === "terms");
  if (terms?.kind !== "terms") throw new Error("A budget without terms cannot be reviewed.");
  return terms.body.reviewRules;
}

function find(state: BudgetState, kind: LineKind, number: string): LineState | undefined {
  return state.lines.find((line) => line.kind === kind && line.number === number);
}

function routingEdit({ operation, kind, number }: LineEdit, { before, after }: ComputedChange): RoutingEdit {
  const was = find(before, kind, number);
  const now = find(after, kind, number);
  return {
    operation,
    kind,
    number,
    changedFields: changedFields(was, now),
    gradeBefore: gradeOf(was),
    gradeAfter: operation === "retire" ? null : gradeOf(now),
  };
}

export function changedFields(was: LineState | undefined, now: LineState | undefined): string[] {
  const before: Map<string, unknown> = new Map(Object.entries(was?.body ?? {}));
  const after: Map<string, unknown> = new Map(Object.entries(now?.body ?? {}));
  const keys = [...new Set([...before.keys(), ...after.keys()])];
  return keys.filter((key) => !sameValue(before.get(key), after.get(key)));
}

function gradeOf(line: LineState | undefined): MaturityGrade | null {
  return line?.kind === "item" ? line.body.grade : null;
}

function routingPoints({ points }: Effects): RoutingPoint[] {
  return points.flatMap(({ operatingPoint, was, now }) =>
    now === null
      ? []
      : [
          {
            operatingPoint,
            limit: now.limitHundredths / 100,
            predictedBefore: was?.predicted ?? null,
            predictedAfter: now.predicted,
            marginBefore: was?.margin ?? null,
            marginAfter: now.margin,
            standingBefore: was?.standing ?? null,
            standingAfter: now.standing,
          },
        ],
  );
}

/** Growth that falls away because a grade rises, on the basic estimate as it will be. */
function growthReleases(change: ComputedChange): GrowthRelease[] {
  const regraded = new Set(
    change.edits
      .filter(({ kind, number, operation }) => {
        if (kind !== "item" || operation === "retire") return false;
        const was = gradeOf(find(change.before, kind, number));
        return was !== null && was !== gradeOf(find(change.after, kind, number));
      })
      .map(({ number }) => number),
  );
  return change.resultsAfter.points.flatMap(({ operatingPoint, items }) =>
    items
      .filter(({ item }) => regraded.has(item))
      .flatMap(({ item, basic, growthFraction }) => {
        const before = resultOf(change.resultsBefore, operatingPoint, item);
        if (before === undefined || before.growthFraction <= growthFraction) return [];
        return [{ item, operatingPoint, released: Math.abs(basic) * (before.growthFraction - growthFraction) }];
      }),
  );
}

function resultOf(results: BudgetResults, operatingPoint: string, item: string) {
  const point = results.points.find((candidate) => candidate.operatingPoint === operatingPoint);
  return point?.items.find((candidate) => candidate.item === item);
}

function newRangeCautions({ items }: Effects): RangeCaution[] {
  return items
    .filter(({ newNotes }) => newNotes.some(({ code }) => RANGE_CAUTIONS.includes(code)))
    .map(({ item, operatingPoint }) => ({ item, operatingPoint }));
}
