import { describe, expect, it } from "vitest";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { measuresOf } from "@/lib/evaluation/budget/measures";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { sideFairing, signPanel, supplyDuct, WINTER } from "@/tests/support/demo-budgets";

function predictedIn(state: BudgetState) {
  const [point] = evaluateBudget(state).points;
  if (!point) throw new Error("no point");
  return measuresOf(point.totals.predicted, point, state);
}

describe("a force in other measures", () => {
  it("is 0.1609 m² and 16.1 road counts for the side fairing, as its table says", () => {
    const measures = predictedIn(sideFairing());
    expect(measures.dragArea).toBeCloseTo(0.1609, 4);
    expect(measures.counts).toBeCloseTo(16.1, 1);
    expect(measures.countSize).toBe(0.001);
    expect(measures.pressureLoss).toBeNull();
  });

  it("is 46.2 Pa for the duct, as its table says, and no power", () => {
    const measures = predictedIn(supplyDuct());
    expect(measures.pressureLoss).toBeCloseTo(46.2, 1);
    expect(measures.power).toBeNull();
  });

  it("is power and energy a year for what moves", () => {
    const state = sideFairing({ otherPoints: { "OP-2": { ...WINTER, hoursPerYear: 2000 } } });
    const winter = evaluateBudget(state).points[1];
    if (!winter) throw new Error("no point");
    // D·U: 60 N at 25 m/s is 1.5 kW, over 2000 h 3000 kWh.
    expect(measuresOf(60, winter, state)).toMatchObject({ power: 1500, energyPerYear: 3000 });
    expect(predictedIn(state).energyPerYear).toBeNull();
  });

  it("has no counts without a reference area", () => {
    expect(predictedIn(signPanel())).toMatchObject({ coefficient: null, counts: null, power: null });
  });
});
