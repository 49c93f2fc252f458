import { MATURITY_GRADES, MATURITY_GRADE_NAMES, type MaturityGrade } from "@/lib/vocabulary/grades";
import type { ProgramManagerRules } from "@/lib/vocabulary/review-rules";
import { STANDING_NAMES, STANDING_ORDER } from "@/lib/vocabulary/standing";
import type { EarlierMove, RoutingEdit, RoutingFacts, RoutingPoint } from "@/policies/routing-facts";

export type RoutingRule = Exclude<keyof ProgramManagerRules, "windowDays"> | "reviewer";

export interface RoutingReason {
  rule: RoutingRule;
  /** Why, in words, with the numbers that decided it. */
  sentence: string;
}

/** Every rule that asks for a program manager beside the reviewer, in the order in which they are told. */
export function programManagerReasons(facts: RoutingFacts): RoutingReason[] {
  const asks = facts.rules.programManagerOn;
  const when = (isAsked: boolean, rule: RoutingRule, sentences: string[]) =>
    isAsked ? sentences.map((sentence): RoutingReason => ({ rule, sentence })) : [];
  return [
    ...when(asks.terms, "terms", touchesTerms(facts)),
    ...when(asks.limit, "limit", touchesLimit(facts)),
    ...when(asks.operatingPointState, "operatingPointState", touchesState(facts)),
    ...when(asks.finish, "finish", touchesFinish(facts)),
    ...when(asks.allocations, "allocations", touchesAllocations(facts)),
    ...when(asks.addOrRetire, "addOrRetire", addsOrRetires(facts)),
    ...when(asks.gradeSteps > 0, "gradeSteps", raisesGrade(facts)),
    ...when(asks.measuredGrade, "measuredGrade", raisesToMeasured(facts)),
    ...when(asks.releasedGrowthPercent > 0, "releasedGrowthPercent", releasesGrowth(facts)),
    ...when(asks.rangeCaution, "rangeCaution", bringsRangeCaution(facts)),
    ...when(asks.predictedRisePercent > 0, "predictedRisePercent", raisesPredicted(facts)),
    ...when(asks.standingWorse, "standingWorse", worsensStanding(facts)),
  ];
}

const STATE_FIELDS: readonly string[] = [
  "fluid",
  "fluidVersion",
  "staticTemperature",
  "staticPressure",
  "pressureAltitude",
  "relativeHumidity",
  "humidityUncertainty",
  "density",
  "dynamicViscosity",
  "speed",
  "hoursPerYear",
];

function touchesTerms({ edits }: RoutingFacts): string[] {
  return edits.some(({ kind }) => kind === "terms") ? ["It touches the terms of the budget."] : [];
}

function touchesLimit({ edits }: RoutingFacts): string[] {
  return operatingPoints(edits, (edit) => changes(edit, ["limitHundredths"])).map(
    (number) => `It touches the limit of operating point ${number}.`,
  );
}

function touchesState({ edits }: RoutingFacts): string[] {
  const isTouched = (edit: RoutingEdit) => edit.operation !== "revise" || changes(edit, STATE_FIELDS);
  return operatingPoints(edits, isTouched).map((number) => `It touches the state of operating point ${number}.`);
}

function touchesFinish({ edits }: RoutingFacts): string[] {
  return edits.filter(({ kind }) => kind === "finish").map(({ number }) => `It touches finish ${number}.`);
}

function touchesAllocations({ edits, transfers, movesAllocations }: RoutingFacts): string[] {
  const isTouched = transfers > 0 || movesAllocations || edits.some(({ kind }) => kind === "allocations");
  return isTouched ? ["It touches the allocations."] : [];
}

const ADD_OR_RETIRE_WORDS = { add: "adds", retire: "retires", reinstate: "reinstates", revise: "" } as const;

function addsOrRetires({ edits }: RoutingFacts): string[] {
  return edits
    .filter(({ kind, operation }) => kind === "item" && operation !== "revise")
    .map(({ operation, number }) => `It ${ADD_OR_RETIRE_WORDS[operation]} item ${number}.`);
}

function raisesGrade({ edits, rules }: RoutingFacts): string[] {
  return raises(edits)
    .filter(({ before, after }) => stepsBetween(before, after) >= rules.programManagerOn.gradeSteps)
    .map(
      ({ number, before, after }) =>
        `It raises the grade of item ${number} by ${stepsBetween(before, after)} steps, ` +
        `from ${MATURITY_GRADE_NAMES[before]} to ${MATURITY_GRADE_NAMES[after]}.`,
    );
}

function raisesToMeasured({ edits }: RoutingFacts): string[] {
  return raises(edits)
    .filter(({ after }) => after === "measured_like_part" || after === "measured_actual")
    .map(({ number, after }) => `It raises the grade of item ${number} to ${MATURITY_GRADE_NAMES[after]}.`);
}

/** Growth released by raised grades over the whole product, so that regrading item by item does not slip through. */
function releasesGrowth({ points, releases, earlierMoves, rules }: RoutingFacts): string[] {
  const { releasedGrowthPercent: percent, windowDays } = rules.programManagerOn;
  return points.flatMap(({ operatingPoint, limit }) => {
    const here = sum(releases.filter((release) => release.operatingPoint === operatingPoint).map((r) => r.released));
    const before = sum(earlierMoves.filter((move) => move.operatingPoint === operatingPoint).map((m) => m.released));
    if (hundredths(here) <= 0 || !reachesShare(here + before, percent, limit)) return [];
    return [
      `Raised grades release ${newtons(here + before)} of growth at ${operatingPoint} within ${windowDays} days, ` +
        `${percent} % of the limit or more.`,
    ];
  });
}

function bringsRangeCaution({ newRangeCautions }: RoutingFacts): string[] {
  const items = [...new Set(newRangeCautions.map(({ item }) => item))];
  return items.map((item) => {
    const points = newRangeCautions.filter((caution) => caution.item === item).map((caution) => caution.operatingPoint);
    return `Item ${item} leaves a stated range at ${[...new Set(points)].join(", ")}, which its base revision did not.`;
  });
}

/**
 * The rise of this proposal alone, or together with what was approved for the same items since a program manager last
 * signed one of their moves: slices add up, and an earlier fall buys no rise.
 */
function raisesPredicted({ points, edits, earlierMoves, rules }: RoutingFacts): string[] {
  const { predictedRisePercent: percent, windowDays } = rules.programManagerOn;
  const moves = itemsOf(edits).flatMap((item) => movesSinceManager(earlierMoves.filter((move) => move.item === item)));
  return points.flatMap(({ operatingPoint, limit, predictedBefore, predictedAfter }) => {
    if (predictedBefore === null) return [];
    const rise = predictedAfter - predictedBefore;
    const along = sum(moves.filter((move) => move.operatingPoint === operatingPoint).map(({ predicted }) => predicted));
    if (reachesShare(rise, percent, limit)) {
      return [`Predicted rises by ${newtons(rise)} at ${operatingPoint}, ${percent} % of the limit or more.`];
    }
    if (hundredths(rise) <= 0 || !reachesShare(rise + along, percent, limit)) return [];
    return [
      `With what was approved for the same items in ${windowDays} days, predicted rises by ${newtons(rise + along)} ` +
        `at ${operatingPoint}, ${percent} % of the limit or more.`,
    ];
  });
}

function worsensStanding({ points }: RoutingFacts): string[] {
  return points.flatMap((point) => worseAt(point) ?? []);
}

function worseAt(point: RoutingPoint): string | null {
  const { operatingPoint, marginBefore, marginAfter, standingBefore, standingAfter } = point;
  if (standingBefore === null || marginBefore === null) {
    return standingAfter === "inside" ? null : `The new operating point ${operatingPoint} is not inside its limit.`;
  }
  if (STANDING_ORDER.indexOf(standingAfter) > STANDING_ORDER.indexOf(standingBefore)) {
    return `The standing at ${operatingPoint} falls from ${STANDING_NAMES[standingBefore]} to ${STANDING_NAMES[standingAfter]}.`;
  }
  const fall = hundredths(marginBefore) - hundredths(marginAfter);
  if (standingAfter === "inside" || fall < 1) return null;
  return `The margin at ${operatingPoint}, which is not inside, falls by ${newtons(fall / 100)}.`;
}

function operatingPoints(edits: readonly RoutingEdit[], isTouched: (edit: RoutingEdit) => boolean): string[] {
  return edits.filter((edit) => edit.kind === "operating_point" && isTouched(edit)).map(({ number }) => number);
}

function changes({ changedFields }: RoutingEdit, fields: readonly string[]): boolean {
  return changedFields.some((field) => fields.includes(field));
}

function raises(edits: readonly RoutingEdit[]): { number: string; before: MaturityGrade; after: MaturityGrade }[] {
  return edits.flatMap(({ number, gradeBefore: before, gradeAfter: after }) =>
    before !== null && after !== null && stepsBetween(before, after) > 0 ? [{ number, before, after }] : [],
  );
}

function stepsBetween(before: MaturityGrade, after: MaturityGrade): number {
  return MATURITY_GRADES.indexOf(after) - MATURITY_GRADES.indexOf(before);
}

function itemsOf(edits: readonly RoutingEdit[]): string[] {
  return edits.filter(({ kind }) => kind === "item").map(({ number }) => number);
}

/** An item's moves after the last one that a program manager signed. */
function movesSinceManager(moves: readonly EarlierMove[]): EarlierMove[] {
  const signed = moves.filter(({ programManagerSigned }) => programManagerSigned).map(({ issue }) => issue);
  return moves.filter(({ issue }) => issue > Math.max(0, ...signed));
}

function reachesShare(value: number, percent: number, limit: number): boolean {
  return hundredths(value) > 0 && hundredths(value) >= (percent * hundredths(limit)) / 100;
}

/** Thresholds are decided on values rounded to 0.01 N; the margin of a millionth keeps 0.125 from falling to 0.12. */
function hundredths(value: number): number {
  return Math.sign(value) * Math.round(Math.abs(value) * 100 + 1e-6);
}

function newtons(value: number): string {
  return `${(hundredths(value) / 100).toFixed(2)} N`;
}

function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}
