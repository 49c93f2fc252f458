import type { BudgetState } from "../lines/line-state";
import { evaluateOperatingPoint } from "./evaluate-budget";
import { indexState } from "./indexed-state";
import { withDragCoefficients, withRoughness, withSpeed, withTemperature } from "./varied-state";

export const VARIABLES = ["speed", "temperature", "roughness", "drag_coefficient"] as const;
export type Variable = (typeof VARIABLES)[number];

/** How far each is varied: fractions of its value, the temperature in kelvins. */
export const STEPS: Record<Variable, number> = { speed: 0.01, temperature: 5, roughness: 0.1, drag_coefficient: 0.1 };

export interface Sensitivity {
  variable: Variable;
  /** What ΣP moves by, newtons, with the variable one step lower and one step higher; null where an item is refused there. */
  lower: number | null;
  higher: number | null;
}

/**
 * What the predicted total at one operating point moves by when one variable is moved everywhere and the whole budget
 * computed anew; what moves it most comes first. A variable that the budget does not have is left out.
 */
export function sensitivities(state: BudgetState, operatingPoint: string): Sensitivity[] {
  const now = predictedOf(state, operatingPoint);
  if (now === null) return [];
  const moved = (varied: BudgetState) => {
    const predicted = predictedOf(varied, operatingPoint);
    return predicted === null ? null : predicted - now;
  };
  return VARIABLES.flatMap((variable): Sensitivity[] => {
    const [low, high] = [vary(state, operatingPoint, variable, -1), vary(state, operatingPoint, variable, 1)];
    return low && high ? [{ variable, lower: moved(low), higher: moved(high) }] : [];
  }).sort((one, other) => reach(other) - reach(one));
}

/** The greater of the two moves. */
export function reach({ lower, higher }: Sensitivity): number {
  return Math.max(Math.abs(lower ?? 0), Math.abs(higher ?? 0));
}

function vary(state: BudgetState, operatingPoint: string, variable: Variable, sign: 1 | -1): BudgetState | null {
  const step = sign * STEPS[variable];
  switch (variable) {
    case "speed":
      return withSpeed(state, operatingPoint, 1 + step);
    case "temperature":
      return withTemperature(state, operatingPoint, step);
    case "roughness":
      return withRoughness(state, 1 + step);
    case "drag_coefficient":
      return withDragCoefficients(state, 1 + step);
  }
}

/** A total in which an item is missing is none. */
function predictedOf(state: BudgetState, operatingPoint: string): number | null {
  const { items, totals } = evaluateOperatingPoint(operatingPoint, indexState(state));
  return items.some(({ refused }) => refused !== null) ? null : totals.predicted;
}
