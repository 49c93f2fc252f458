import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { budgetUncertainty } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import { budgetState } from "@/tests/support/budget-state";
import { bestTimes } from "./processor-time";

const PLATES = 500;
const ROUNDS = 15;

/** Plates by the automatic choice on one uncertain finish, lengths and breadths uncertain too. */
function plateBudget() {
  const uncertain = (value: number) => ({ value, standardUncertainty: value / 100 });
  const plate = (index: number) => ({
    ...{ name: `Plate ${index}`, order: index, ownerId: 1, grade: "estimated", methodVersion: 1, finish: "F90" },
    ...{ method: "flat-plate-friction", length: uncertain(1 + index / 100), breadth: uncertain(0.5), faces: 2 },
    frictionLine: "automatic",
    roughness: null,
  });
  return budgetState({
    code: "BN-3",
    name: "Bench",
    kind: "other_body",
    point: {
      fluid: "air",
      staticTemperature: { value: 288.15, standardUncertainty: 2 },
      staticPressure: { value: 101325, standardUncertainty: 800 },
      speed: { value: 25, standardUncertainty: 0.25 },
    },
    finishes: { F90: { name: "Bench", roughness: { value: 3e-5, standardUncertainty: 3e-6 }, source: "bench" } },
    limitHundredths: 1_000_000,
    reserveHundredths: 0,
    items: Object.fromEntries(
      Array.from({ length: PLATES }, (_, index) => [String(index).padStart(3, "0"), plate(index)]),
    ),
  });
}

/**
 * Milliseconds that the transaction of a last signature spends on the first-order uncertainty of 500 plates, beside those
 * of evaluating them once. Six causes reach each plate, each is tried at four values beside the nominal one.
 */
export function uncertaintyTimes() {
  const state = plateBudget();
  const results = evaluateBudget(state);
  return bestTimes(
    {
      evaluated: () => evaluateBudget(state).points[0]?.totals.basic ?? NaN,
      uncertainty: () => {
        const outcome = budgetUncertainty(state, results, "OP-1");
        return "refused" in outcome ? NaN : outcome.basic.standardUncertainty;
      },
    },
    ROUNDS,
  );
}
