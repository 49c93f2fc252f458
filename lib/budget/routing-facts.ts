import type { BudgetResults, ItemResult, PointResult } from "@/lib/evaluation/budget/results";
import { ALLOCATIONS_NUMBER } from "@/lib/evaluation/lines/allocations-body";
import type { BudgetState, LineState } from "@/lib/evaluation/lines/line-state";
import type { NoteCode } from "@/lib/evaluation/notes/note-code";
import { MATURITY_GRADES } from "@/lib/vocabulary/grades";
import type { EditOperation, LineKind } from "@/lib/vocabulary/lines";
import type { ReviewRules } from "@/lib/vocabulary/review-rules";
import type {
  EarlierMove,
  GrowthRelease,
  RangeCaution,
  RoutingEdit,
  RoutingFacts,
  RoutingPoint,
} from "@/policies/routing-facts";
import { changedFields } from "./changed-fields";

export interface EditedLine {
  operation: EditOperation;
  kind: LineKind;
  number: string;
}

export interface ChangeToRoute {
  rules: ReviewRules;
  edits: readonly EditedLine[];
  transfers: number;
  before: { state: BudgetState; results: BudgetResults };
  after: { state: BudgetState; results: BudgetResults };
  earlierMoves: readonly EarlierMove[];
}

/** The plain facts by which a change is routed, picked from its state and results before and after. */
export function routingFacts(change: ChangeToRoute): RoutingFacts {
  const { rules, edits, transfers, before, after, earlierMoves } = change;
  return {
    rules,
    edits: edits.map((edit) => routingEdit(edit, before.state, after.state)),
    transfers,
    movesAllocations: allocationsMoved(before.state, after.state),
    points: after.results.points.map((point) => routingPoint(pointOf(before.results, point.operatingPoint), point)),
    releases: edits.flatMap((edit) => releasesOf(edit, change)),
    newRangeCautions: newRangeCautions(change),
    earlierMoves,
  };
}

/** Owners of the edited items, before and after: they may not sign. */
export function ownersOfEdits(
  edits: readonly EditedLine[],
  before: BudgetState,
  after: BudgetState,
): { item: string; ownerId: number }[] {
  return edits
    .filter(({ kind }) => kind === "item")
    .flatMap(({ number }) =>
      [itemOf(before, number), itemOf(after, number)].flatMap((line) =>
        line ? [{ item: number, ownerId: line.body.ownerId }] : [],
      ),
    );
}

/** Growth that a raised grade takes out of an item's predicted value, at every operating point of both sides. */
export function releasedGrowth(
  item: string,
  before: { state: BudgetState; results: BudgetResults },
  after: { state: BudgetState; results: BudgetResults },
): GrowthRelease[] {
  const [gradeBefore, gradeAfter] = [itemOf(before.state, item)?.body.grade, itemOf(after.state, item)?.body.grade];
  if (!gradeBefore || !gradeAfter) return [];
  if (MATURITY_GRADES.indexOf(gradeAfter) <= MATURITY_GRADES.indexOf(gradeBefore)) return [];
  return after.results.points.flatMap((point) => {
    const now = resultOf(point, item);
    const was = resultOf(pointOf(before.results, point.operatingPoint), item);
    if (!now || !was) return [];
    const released = Math.abs(now.basic) * (was.growthFraction - now.growthFraction);
    return [{ item, operatingPoint: point.operatingPoint, released }];
  });
}

/** Notes that say an answer lies outside the range its formula or evidence was stated for. */
const RANGE_NOTES: readonly NoteCode[] = [
  "reynolds-outside-line-range",
  "roughness-ratio-outside-range",
  "mach-above-limit",
  "humid-air-outside-range",
  "measured-reynolds-differs",
];

function routingEdit({ operation, kind, number }: EditedLine, before: BudgetState, after: BudgetState): RoutingEdit {
  const was = lineOf(before, kind, number);
  const now = lineOf(after, kind, number);
  return {
    operation,
    kind,
    number,
    changedFields: was && now ? changedFields(was.body, now.body) : [],
    gradeBefore: was?.kind === "item" ? was.body.grade : null,
    gradeAfter: now?.kind === "item" ? now.body.grade : null,
  };
}

function routingPoint(was: PointResult | undefined, now: PointResult): RoutingPoint {
  return {
    operatingPoint: now.operatingPoint,
    limit: now.limitHundredths / 100,
    predictedBefore: was?.totals.predicted ?? null,
    predictedAfter: now.totals.predicted,
    marginBefore: was?.totals.margin ?? null,
    marginAfter: now.totals.margin,
    standingBefore: was?.standing ?? null,
    standingAfter: now.standing,
  };
}

function releasesOf({ kind, number }: EditedLine, { before, after }: ChangeToRoute): GrowthRelease[] {
  return kind === "item" ? releasedGrowth(number, before, after) : [];
}

/** At a new operating point only edited items count: what its state brings to others is listed, and routed as such. */
function newRangeCautions({ edits, before, after }: ChangeToRoute): RangeCaution[] {
  const edited = edits.filter(({ kind }) => kind === "item").map(({ number }) => number);
  return after.results.points.flatMap((point) => {
    const was = pointOf(before.results, point.operatingPoint);
    return point.items
      .filter((result) => was !== undefined || edited.includes(result.item))
      .filter((result) => rangeNotes(result).some((code) => !rangeNotes(resultOf(was, result.item)).includes(code)))
      .map(({ item }) => ({ item, operatingPoint: point.operatingPoint }));
  });
}

function rangeNotes(result: ItemResult | undefined): NoteCode[] {
  const cautions = result?.notes.filter(({ severity }) => severity === "caution") ?? [];
  return cautions.map(({ code }) => code).filter((code) => RANGE_NOTES.includes(code));
}

function pointOf(results: BudgetResults, operatingPoint: string): PointResult | undefined {
  return results.points.find((point) => point.operatingPoint === operatingPoint);
}

function resultOf(point: PointResult | undefined, item: string): ItemResult | undefined {
  return point?.items.find((result) => result.item === item && result.refused === null);
}

function lineOf(state: BudgetState, kind: LineKind, number: string): LineState | undefined {
  return state.lines.find((line) => line.kind === kind && line.number === number);
}

function itemOf(state: BudgetState, number: string) {
  const line = lineOf(state, "item", number);
  return line?.kind === "item" ? line : undefined;
}

/** Whether the sheet gets a new revision: another tree gives it one even where no number on it moves. */
function allocationsMoved(before: BudgetState, after: BudgetState): boolean {
  const [was, now] = [
    lineOf(before, "allocations", ALLOCATIONS_NUMBER),
    lineOf(after, "allocations", ALLOCATIONS_NUMBER),
  ];
  return was?.letter !== now?.letter;
}
