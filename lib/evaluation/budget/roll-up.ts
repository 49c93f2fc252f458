import { roundHundredths, roundStored } from "@/lib/units/rounding";
import type { Standing } from "@/lib/vocabulary/standing";
import type { IndexedState } from "./indexed-state";
import type { ItemResult, Totals } from "./results";

export interface LimitAndReserve {
  limitHundredths: number;
  reserveHundredths: number;
}

/** Versions of this roll-up that an issue may name. */
export const ROLL_UP_VERSIONS: readonly number[] = [1];

/**
 * An empty limit is the reference point's; a reserve that isn't given scales with the limit.
 *
 * @throws RangeError if the reference operating point has no limit or no reserve: no change may bring that about
 */
export function limitAndReserve(operatingPoint: string, { terms, operatingPoints }: IndexedState): LimitAndReserve {
  const reference = operatingPoints.get(terms.referenceOperatingPoint)?.limitHundredths ?? null;
  const referenceReserve = reserveGivenAt(terms.referenceOperatingPoint, terms.reserves);
  if (reference === null || referenceReserve === undefined) throw new RangeError("the reference point lacks a limit");

  const limitHundredths = operatingPoints.get(operatingPoint)?.limitHundredths ?? reference;
  const scaled = Math.round((referenceReserve * limitHundredths) / reference);
  return { limitHundredths, reserveHundredths: reserveGivenAt(operatingPoint, terms.reserves) ?? scaled };
}

/** Sums over the items that have a result, and what they leave of the limit. */
export function totalsOf(
  items: readonly ItemResult[],
  savings: ReadonlySet<string>,
  { limitHundredths, reserveHundredths }: LimitAndReserve,
): Totals {
  const sums = { basic: 0, growth: 0, predicted: 0, withoutSavings: 0 };
  for (const { item, basic, growth, predicted } of items) {
    sums.basic += basic;
    sums.growth += growth;
    sums.predicted += predicted;
    if (savings.size === 0 || !savings.has(item)) sums.withoutSavings += predicted;
  }
  const predicted = roundStored(sums.predicted);
  const margin = roundStored(limitHundredths / 100 - predicted);
  return {
    basic: roundStored(sums.basic),
    growth: roundStored(sums.growth),
    predicted,
    predictedWithoutSavings: roundStored(sums.withoutSavings),
    margin,
    clearOfReserve: roundStored(margin - reserveHundredths / 100),
  };
}

/** Decided on values rounded to 0.01 N. */
export function standingOf({ margin }: Pick<Totals, "margin">, reserveHundredths: number): Standing {
  const rounded = roundHundredths(margin);
  if (rounded < 0) return "over";
  return rounded < reserveHundredths / 100 ? "into_the_reserve" : "inside";
}

function reserveGivenAt(operatingPoint: string, reserves: IndexedState["terms"]["reserves"]): number | undefined {
  return reserves.find((row) => row.operatingPoint === operatingPoint)?.hundredths;
}
