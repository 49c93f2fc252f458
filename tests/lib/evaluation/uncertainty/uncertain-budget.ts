import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { budgetModel, type BudgetModel } from "@/lib/evaluation/uncertainty/budget-model";
import { budgetUncertainty, type PointUncertainty } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import { monteCarlo, type MonteCarloResult } from "@/lib/evaluation/uncertainty/monte-carlo";
import { budgetState } from "@/tests/support/budget-state";

export function spread(value: number, standardUncertainty: number) {
  return { value, standardUncertainty };
}

/** An item by any method, estimated and of its first version. */
export function item(method: string, fields: object) {
  return { name: method, order: 10, ownerId: 1, grade: "estimated", method, methodVersion: 1, ...fields };
}

export function plate(length: object, breadth: object, faces: number, more: object = {}) {
  const line = { roughness: { value: 0 }, transition: "tripped", frictionLine: "one-fifth-law" };
  return item("flat-plate-friction", { length, breadth, faces, ...line, ...more });
}

export function body(dragCoefficient: number, coefficientUncertainty: number | null, referenceArea: object) {
  return item("bluff-body", { source: "Test", dragCoefficient, coefficientUncertainty, referenceArea });
}

export function fixed(force: object, more: object = {}) {
  return item("fixed", { source: "Test", force, ...more });
}

export function share(fraction: number, of: string[], coefficientUncertainty: number | null) {
  return item("share", { source: "Test", fraction, of, coefficientUncertainty });
}

export const CUSTOM = {
  fluid: "custom",
  density: spread(1.185, 0.0095),
  dynamicViscosity: spread(1.84e-5, 1.8e-7),
  speed: spread(24, 0.36),
};

export function budget(items: Record<string, object>, more: object = {}): BudgetState {
  return budgetState({
    code: "UN-1",
    name: "Uncertain",
    kind: "vehicle_fairing",
    point: CUSTOM,
    limitHundredths: 4000,
    reserveHundredths: 0,
    items,
    ...more,
  });
}

export function modelOf(state: BudgetState, operatingPoint = "OP-1"): BudgetModel {
  const point = evaluateBudget(state).points.find((each) => each.operatingPoint === operatingPoint);
  if (!point) throw new Error(`no point ${operatingPoint}`);
  const model = budgetModel(state, point);
  if ("refused" in model) throw new Error(`refused: ${model.refused.join(", ")}`);
  return model;
}

export function uncertaintyOf(state: BudgetState, operatingPoint = "OP-1"): PointUncertainty {
  const outcome = budgetUncertainty(state, evaluateBudget(state), operatingPoint);
  if ("refused" in outcome) throw new Error(`refused: ${outcome.refused.join(", ")}`);
  return outcome;
}

export function drawn(state: BudgetState, draws: number, seed: number, operatingPoint = "OP-1"): MonteCarloResult {
  const outcome = monteCarlo(state, operatingPoint, { draws, seed });
  if (!outcome || "refused" in outcome) throw new Error("no result");
  return outcome;
}

/** The contribution of a cause to ΣB; 0 where it is too small to be told. */
export function newtonsOf({ causes }: PointUncertainty, key: string): number {
  return causes.find((cause) => cause.key === key)?.newtons ?? 0;
}
