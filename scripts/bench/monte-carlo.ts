import { drawModel } from "@/lib/evaluation/uncertainty/monte-carlo";
import { budgetModel, type BudgetModel } from "@/lib/evaluation/uncertainty/budget-model";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { budgetState } from "@/tests/support/budget-state";
import { bestTimes } from "./processor-time";

const DRAWS = 10_000;
const ITEMS = 200;
const ROUNDS = 3;

const POINT = { density: 1.2, dynamicViscosity: 1.8e-5, speed: 25 };
const CRITICAL = 5e5;

/** Plates by Prandtl–Schlichting with natural transition and bodies, by turns; every number uncertain. */
function lineOf(index: number): object {
  const common = { name: `Item ${index}`, order: index, ownerId: 1, grade: "estimated", methodVersion: 1 };
  const uncertain = (value: number) => ({ value, standardUncertainty: value / 100 });
  return index % 2 === 0
    ? {
        ...common,
        method: "flat-plate-friction",
        length: uncertain(1 + index / 100),
        breadth: uncertain(0.5),
        faces: 2,
        roughness: { value: 0 },
        frictionLine: "prandtl-schlichting",
      }
    : {
        ...common,
        method: "bluff-body",
        source: "bench",
        dragCoefficient: 0.5,
        coefficientUncertainty: 0.02,
        referenceArea: uncertain(0.01 + index / 1e4),
      };
}

const state = budgetState({
  code: "BN-1",
  name: "Bench",
  kind: "other_body",
  point: {
    fluid: "custom",
    density: { value: POINT.density, standardUncertainty: 0.01 },
    dynamicViscosity: { value: POINT.dynamicViscosity, standardUncertainty: 1e-7 },
    speed: { value: POINT.speed, standardUncertainty: 0.25 },
  },
  limitHundredths: 1_000_000,
  reserveHundredths: 0,
  items: Object.fromEntries(
    Array.from({ length: ITEMS }, (_, index) => [String(index).padStart(3, "0"), lineOf(index)]),
  ),
});

const REPLACED = CRITICAL * (0.455 / Math.log10(CRITICAL) ** 2.58 - 1.328 / Math.sqrt(CRITICAL));

/** The same draws and formulas written out for this one budget: no causes, no versions, no lines to choose from. */
function bareLoop(): number {
  const lengths = Float64Array.from({ length: ITEMS / 2 }, (_, index) => 1 + (2 * index) / 100);
  const areas = Float64Array.from({ length: ITEMS / 2 }, (_, index) => 0.01 + (2 * index + 1) / 1e4);
  let sum = 0;
  for (let draw = 0; draw < DRAWS; draw += 1) {
    const density = POINT.density + 0.01 * boxMuller();
    const viscosity = POINT.dynamicViscosity + 1e-7 * boxMuller();
    const speed = POINT.speed + 0.25 * boxMuller();
    const q = 0.5 * density * speed * speed;
    const lineBias = 1 + 0.04 * boxMuller();
    const bodyBias = 1 + 0.05 * boxMuller();
    for (const mean of lengths) {
      const length = mean * (1 + boxMuller() / 100);
      const reynolds = (density * speed * length) / viscosity;
      const coefficient = 0.455 / Math.log10(reynolds) ** 2.58 - REPLACED / reynolds;
      sum += q * length * (1 + boxMuller() / 100) * coefficient * lineBias;
    }
    for (const area of areas) sum += q * (0.5 + 0.02 * boxMuller()) * area * (1 + boxMuller() / 100) * bodyBias;
  }
  return sum;
}

function boxMuller(): number {
  return Math.sqrt(-2 * Math.log(1 - Math.random())) * Math.cos(2 * Math.PI * Math.random());
}

function benchModel(): BudgetModel {
  const [point] = evaluateBudget(state).points;
  if (!point) throw new Error("the bench has no operating point");
  const model = budgetModel(state, point);
  if ("refused" in model) throw new Error("the bench has refused items");
  return model;
}

const model = benchModel();

function drawnSum(): number {
  const batches = drawModel(model, { draws: DRAWS, seed: 1 });
  for (let step = batches.next(); ; step = batches.next()) if (step.done) return step.value.basic.mean;
}

/** Milliseconds of processor that each takes. */
export function monteCarloTimes() {
  return bestTimes({ bare: bareLoop, drawn: drawnSum }, ROUNDS);
}
