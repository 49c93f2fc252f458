import { indexState } from "../budget/indexed-state";
import type { BudgetResults } from "../budget/results";
import type { BudgetState } from "../lines/line-state";
import { type MeasureBasis, measureBasis } from "./measure-basis";

/** To what the forces at an operating point are referred before a change and after it; null on the side without it. */
export interface EffectBasis {
  operatingPoint: string;
  was: MeasureBasis | null;
  now: MeasureBasis | null;
}

interface Side {
  state: BudgetState;
  results: BudgetResults;
}

/** A change may move what forces are referred to: speed, air, reference area. */
export function effectBases(before: Side, after: Side): EffectBasis[] {
  const [was, now] = [basesOf(before), basesOf(after)];
  return [...new Set([...now.keys(), ...was.keys()])].map((operatingPoint) => ({
    operatingPoint,
    was: was.get(operatingPoint) ?? null,
    now: now.get(operatingPoint) ?? null,
  }));
}

function basesOf({ state, results }: Side): Map<string, MeasureBasis> {
  const { product, terms, operatingPoints } = indexState(state);
  return new Map(
    results.points.map(({ operatingPoint, stream }) => {
      const hoursPerYear = operatingPoints.get(operatingPoint)?.hoursPerYear ?? null;
      return [operatingPoint, measureBasis(product.kind, terms, stream, hoursPerYear)];
    }),
  );
}
