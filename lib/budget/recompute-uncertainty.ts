import type { PointUncertainty, PointUncertaintyOutcome } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import { agree, type RecomputedDifference } from "./recomputed-difference";
import type { StoredUncertainty } from "./stored-uncertainty";

/** Every number of the frozen uncertainty that differs from the one computed again. */
export function uncertaintyDifferences(stored: StoredUncertainty, again: StoredUncertainty): RecomputedDifference[] {
  return stored.points.flatMap((point) => {
    const other = again.points.find(({ operatingPoint }) => operatingPoint === point.operatingPoint);
    return differencesAt(point.operatingPoint, numbersOf(point), numbersOf(other));
  });
}

interface ComparedNumber {
  item: string;
  value: number;
  /** Of what size a difference counts. */
  least: number;
}

function differencesAt(
  operatingPoint: string,
  stored: ReadonlyMap<string, ComparedNumber>,
  again: ReadonlyMap<string, ComparedNumber>,
): RecomputedDifference[] {
  return [...new Set([...stored.keys(), ...again.keys()])].flatMap((quantity) => {
    const [one, other] = [stored.get(quantity), again.get(quantity)];
    if (one && other && agree(one.value, other.value, one.least)) return [];
    const item = one?.item ?? other?.item ?? "";
    return [
      { operatingPoint, item, quantity, stored: one?.value ?? Number.NaN, recomputed: other?.value ?? Number.NaN },
    ];
  });
}

/** Newtons are compared as parts of the total's uncertainty, probabilities and shares as parts of one. */
function numbersOf(point: PointUncertaintyOutcome | undefined): ReadonlyMap<string, ComparedNumber> {
  const numbers = new Map<string, ComparedNumber>();
  if (!point) return numbers;
  const add = (quantity: string, value: number, least: number, item = ""): void =>
    void numbers.set(`uncertainty.${quantity}`, { item, value, least });
  if ("refused" in point) {
    for (const item of point.refused) add(`refused.${item}`, 1, 1, item);
    return numbers;
  }
  const u = point.basic.standardUncertainty;
  addTotals(point, u, add);
  for (const { item, standardUncertainty } of point.items) add(`item.${item}`, standardUncertainty, u, item);
  for (const { key, newtons, share } of point.causes) {
    add(`${key}.newtons`, newtons, u);
    add(`${key}.share`, share, 1);
  }
  add("otherCauses.count", point.otherCauses.count, 1);
  add("otherCauses.share", point.otherCauses.share, 1);
  return numbers;
}

function addTotals(
  { basic, predicted, basicExceedsLimit, predictedExceedsLimit }: PointUncertainty,
  u: number,
  add: (quantity: string, value: number, least: number) => void,
): void {
  for (const [name, value] of Object.entries(basic)) add(`basic.${name}`, value, u);
  for (const [name, value] of Object.entries(predicted)) add(`predicted.${name}`, value, u);
  add("basicExceedsLimit", basicExceedsLimit, 1);
  add("predictedExceedsLimit", predictedExceedsLimit, 1);
}
