import { describe, expect, it } from "vitest";
import type { BudgetModel } from "@/lib/evaluation/uncertainty/budget-model";
import { firstOrder } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import { drawModel, type MonteCarloResult } from "@/lib/evaluation/uncertainty/monte-carlo";
import { expectRelative } from "@/tests/support/relative";
import { numberAt, readVectors } from "@/tests/vectors/read-vectors";
import { body, budget, fixed, modelOf, plate, spread } from "./uncertain-budget";

/**
 * The whole-budget case of uncertainty.json. Its single items are compared in methods/uncertainty.test.ts. Its Type A and B
 * evaluations and Welch–Satterthwaite are not: the product takes standard uncertainties, without degrees of freedom.
 */
const [VECTOR] = readVectors("uncertainty.json").filter(({ kind }) => kind === "budget_six_items");
if (!VECTOR) throw new Error("the vector of six items is missing");
const EXPECTED = VECTOR.expected;

/** The standard uncertainty of a rectangular and of a triangular distribution (GUM 4.3.7, 4.3.9). */
const rectangular = (low: number, high: number): number => (high - low) / 2 / Math.sqrt(3);
const triangular = (low: number, high: number): number => (high - low) / 2 / Math.sqrt(6);

const STATE = budget({
  "010": plate({ value: 3.1 }, { value: 1.15 }, 2),
  "020": plate({ value: 2.2 }, { value: 0.9 }, 1),
  "030": plate({ value: 0.22 }, { value: 0.9 }, 2, { transition: "laminar" }),
  "040": body(1.18, rectangular(1.06, 1.3), spread(0.034, 0.0007)),
  "050": body(1.2, triangular(1.05, 1.35), spread(0.011, 0.0003)),
  "060": fixed(spread(0.9, rectangular(0.5, 1.3))),
});

/** Our lines bring the 5 % and 2 % of the vector's factors; it has none for the coefficients beside their own spread. */
function referenceModel(): BudgetModel {
  const model = modelOf(STATE);
  const causes = model.causes.map((cause) =>
    cause.key === "method:bluff-body" ? { ...cause, standardUncertainty: 1e-30 } : cause,
  );
  return { ...model, causes };
}

const KEYS: Record<string, string> = {
  speed_m_s: "operating_point:OP-1:speed",
  density_kg_m3: "operating_point:OP-1:density",
  turbulent_factor: "method:one-fifth-law",
  area_bracket_m2: "item:040:referenceArea",
  Cd_bracket: "item:040:dragCoefficient",
  area_stalk_m2: "item:050:referenceArea",
  Cd_stalk: "item:050:dragCoefficient",
  gap_allowance_N: "item:060:force",
};

describe("the reference budget of six items, to first order", () => {
  const result = firstOrder(referenceModel());

  it("has the nominal total and the uncertainty of each item", () => {
    expectRelative(result.basic.value, numberAt(EXPECTED, "total_nominal_N"), 1e-8, "total");
    const items = EXPECTED.item_standard_uncertainty_N as number[];
    expect(result.items).toHaveLength(items.length);
    result.items.forEach(({ standardUncertainty }, index) =>
      expectRelative(standardUncertainty, items[index] ?? Number.NaN, 1e-8, `item ${index}`),
    );
  });

  it("adds what items share linearly: more than independent items would have", () => {
    expectRelative(result.basic.standardUncertainty, numberAt(EXPECTED, "sum_gum_shared_inputs_N"), 1e-8);
    expect(result.basic.standardUncertainty).toBeGreaterThan(numberAt(EXPECTED, "sum_rss_items_independent_N"));
    expect(result.basic.standardUncertainty).toBeLessThan(numberAt(EXPECTED, "sum_linear_fully_correlated_N"));
  });

  it("shares the variance out by cause", () => {
    const shares = EXPECTED.variance_share_by_input as Record<string, number>;
    for (const [name, key] of Object.entries(KEYS)) {
      const cause = result.causes.find((each) => each.key === key);
      expectRelative(cause?.share, shares[name] ?? Number.NaN, 1e-7, name);
    }
    const small = (shares.dynamic_viscosity_Pa_s ?? 0) + (shares.laminar_factor ?? 0);
    expectRelative(result.otherCauses.share, small, 1e-6, "viscosity and laminar bias");
    const all = result.causes.reduce((sum, { share }) => sum + share, result.otherCauses.share);
    expect(all).toBeCloseTo(1, 10);
  });
});

describe("the reference budget of six items, drawn", () => {
  const DRAWS = 100_000;
  const tolerance = (EXPECTED.tolerance_absolute_for_another_generator_by_sample_size as Record<string, never>)[DRAWS];
  const reference = EXPECTED.monte_carlo as Record<string, never>;
  const result = runToEnd(20261201);

  it("has the exact mean and standard deviation within the tolerance of its size", () => {
    expect(Math.abs(result.basic.mean - numberAt(EXPECTED, "exact_mean_N"))).toBeLessThan(
      numberAt(tolerance ?? {}, "mean_N"),
    );
    expect(Math.abs(result.basic.standardDeviation - numberAt(EXPECTED, "exact_standard_deviation_N"))).toBeLessThan(
      numberAt(tolerance ?? {}, "standard_deviation_N"),
    );
  });

  // Our causes are all normal. That leaves mean and deviation exact, where coefficient, area and force enter linearly, and
  // moves the ends by 0.01 N: the sum of the vector has a kurtosis of 2.87.
  it("has the 95 % interval within the tolerance of its size", () => {
    const [low, high] = [result.basic.low95, result.basic.high95];
    expect(Math.abs(low - numberAt(reference, "low_95_symmetric_N"))).toBeLessThan(
      numberAt(tolerance ?? {}, "low_95_N"),
    );
    expect(Math.abs(high - numberAt(reference, "high_95_symmetric_N"))).toBeLessThan(
      numberAt(tolerance ?? {}, "high_95_N"),
    );
  });

  it("agrees with first order within 2 %", () => {
    const linear = firstOrder(referenceModel());
    expectRelative(result.basic.standardDeviation, linear.basic.standardUncertainty, 0.02);
    expectRelative(result.predicted.standardDeviation, linear.predicted.standardUncertainty, 0.02);
  });

  function runToEnd(seed: number): MonteCarloResult {
    const batches = drawModel(referenceModel(), { draws: DRAWS, seed });
    for (let step = batches.next(); ; step = batches.next()) if (step.done) return step.value;
  }
});
