import type { BudgetState } from "../lines/line-state";
import { evaluateOperatingPoint } from "./evaluate-budget";
import { indexState } from "./indexed-state";
import { withSpeed } from "./varied-state";

export interface TotalAtSpeed {
  /** m/s. */
  speed: number;
  /** ΣB and ΣP in newtons; null where an item is refused at that speed. */
  totals: { basic: number; predicted: number } | null;
}

const LEAST_PART = 0.5;
const GREATEST_PART = 1.5;

/** The whole budget in the fluid of one operating point, from half its speed to half as much again. */
export function totalOverSpeed(state: BudgetState, operatingPoint: string, count: number): TotalAtSpeed[] {
  return Array.from({ length: count }, (_, index) => {
    const part = LEAST_PART + ((GREATEST_PART - LEAST_PART) * index) / (count - 1);
    const { stream, items, totals } = evaluateOperatingPoint(
      operatingPoint,
      indexState(withSpeed(state, operatingPoint, part)),
    );
    const isWhole = items.every(({ refused }) => refused === null);
    return { speed: stream.speed, totals: isWhole ? { basic: totals.basic, predicted: totals.predicted } : null };
  });
}
