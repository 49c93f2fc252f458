import { STANDING_ORDER } from "@/lib/vocabulary/standing";
import type { BudgetState } from "../lines/line-state";
import type { OperatingPointBody } from "../lines/operating-point-body";
import { streamStateOf } from "../methods/stream-state";
import { evaluatePoint } from "./evaluate-point";
import { indexState, type IndexedState } from "./indexed-state";
import { streamInputOf } from "./method-input";
import type { BudgetResults, ItemResult, PointResult } from "./results";
import { limitAndReserve, ROLL_UP_VERSIONS, standingOf, totalsOf } from "./roll-up";
import { oncePer } from "./once-per";
import { compareNumbers } from "./sheet-order";

export interface EvaluationOptions {
  /** A frozen result that still holds; everything without one is computed. */
  frozen?: (operatingPoint: string, item: string) => ItemResult | undefined;
}

/**
 * Every item at every operating point, with totals and standing, by the versions that the lines name.
 *
 * @throws RangeError if the state refers to what it does not have: no change that was applied without faults does
 */
export function evaluateBudget(state: BudgetState, options: EvaluationOptions = {}): BudgetResults {
  const indexed = indexState(state);
  if (!ROLL_UP_VERSIONS.includes(indexed.terms.rollUpVersion)) {
    throw new RangeError(`no roll-up of version ${indexed.terms.rollUpVersion}`);
  }

  const points = pointOrder(indexed).map((number) => evaluateOperatingPoint(number, indexed, options));
  const [worst] = [...points].sort(worseFirst);
  if (!worst) throw new RangeError("the budget has no operating point in force");
  return { points, worstPoint: worst.operatingPoint };
}

/** Every item at one operating point, with its totals and standing. */
export function evaluateOperatingPoint(
  number: string,
  state: IndexedState,
  { frozen }: EvaluationOptions = {},
): PointResult {
  const body = state.operatingPoints.get(number);
  if (!body) throw new RangeError(`no operating point ${number} in force`);

  const stream = streamOf(body);
  const limits = limitAndReserve(number, state);
  const items = evaluatePoint({ operatingPoint: number, stream, frozen: (item) => frozen?.(number, item) }, state);
  const totals = totalsOf(items, savingsOf(state.items), limits);
  const standing = standingOf(totals, limits.reserveHundredths);
  return { operatingPoint: number, name: body.name, stream, ...limits, items, totals, standing };
}

const streamOf = oncePer((body: OperatingPointBody) => streamStateOf(streamInputOf(body)));

const savingsOf = oncePer(
  (items: IndexedState["items"]): ReadonlySet<string> =>
    new Set([...items].flatMap(([item, { saving }]) => (saving ? [item] : []))),
);

/** The reference operating point first, the others by number. */
function pointOrder({ terms, operatingPoints }: IndexedState): string[] {
  const others = [...operatingPoints.keys()].filter((number) => number !== terms.referenceOperatingPoint);
  return [terms.referenceOperatingPoint, ...others.sort(compareNumbers)];
}

/** The worse standing, then the smaller part of the limit that is left. */
function worseFirst(one: PointResult, other: PointResult): number {
  const standing = STANDING_ORDER.indexOf(other.standing) - STANDING_ORDER.indexOf(one.standing);
  return standing || one.totals.margin / one.limitHundredths - other.totals.margin / other.limitHundredths;
}
