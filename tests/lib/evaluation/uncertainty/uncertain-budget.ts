import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { budgetModel, type BudgetModel } from "@/lib/evaluation/uncertainty/budget-model";
import { budgetUncertainty, type PointUncertainty } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import { monteCarlo, type MonteCarloResult } from "@/lib/evaluation/uncertainty/monte-carlo";
import { budgetState } from "@/tests/support/budget-state";

export function spread(value: number, standardUncertainty: number) {
  return { value, standardUncertainty };
}

export function plate(length: object, breadth: object, faces: number, more: object = {}) {
  return {
    name: "Plate",
    order: 10,
    ownerId: 1,
    grade: "estimated",
    method: "flat-plate-friction",
    methodVersion: 1,
    length,
    breadth,
    faces,
    roughness: { value: 0 },
    transition: "tripped",
    frictionLine: "one-fifth-law",
    ...more,
  };
}

export function body(dragCoefficient: number, coefficientUncertainty: number | null, area: object, more: object = {}) {
  const own = { method: "bluff-body", dragCoefficient, coefficientUncertainty, referenceArea: area };
  return { ...common("Body"), ...own, ...more };
}

export function fixed(force: object, more: object = {}) {
  return { ...common("Fixed"), method: "fixed", force, ...more };
}

export function share(fraction: number, of: string[], more: object = {}) {
  return { ...common("Share"), method: "share", fraction, of, ofGroup: null, includeSavings: false, ...more };
}

function common(name: string) {
  return { name, order: 10, ownerId: 1, grade: "estimated", methodVersion: 1, source: "Test" };
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
