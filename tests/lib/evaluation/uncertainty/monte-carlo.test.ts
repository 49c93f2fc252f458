import { describe, expect, it } from "vitest";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { drawModel, monteCarlo, monteCarloBatches } from "@/lib/evaluation/uncertainty/monte-carlo";
import { sideFairing, signPanel, supplyDuct } from "@/tests/support/demo-budgets";
import { expectRelative } from "@/tests/support/relative";
import { body, budget, drawn, fixed, modelOf, plate, share, spread, uncertaintyOf } from "./uncertain-budget";

const STILL = { fluid: "custom", density: { value: 1 }, dynamicViscosity: { value: 1e-5 }, speed: { value: 10 } };
/** The standard deviation of so many draws is good to 0.6 %. */
const DRAWS = 15_000;

describe("drawing a budget", () => {
  it.each([sideFairing(), supplyDuct(), signPanel()])(
    "agrees with first order within 2 % where it is nearly linear: $product.name",
    (state: BudgetState) => {
      const linear = uncertaintyOf(state);
      const result = drawn(state, DRAWS, 11);
      expectRelative(result.basic.mean, linear.basic.value, 0.005, "mean");
      expectRelative(result.basic.standardDeviation, linear.basic.standardUncertainty, 0.02, "ΣB");
      expectRelative(result.predicted.standardDeviation, linear.predicted.standardUncertainty, 0.02, "ΣB + ΣG");
      expect(Math.abs(result.predictedExceedsLimit - linear.predictedExceedsLimit)).toBeLessThan(0.02);
    },
  );

  it("draws what items share once for all: shares, members and a stream of their own included", () => {
    const state = budget({
      "010": plate(spread(2, 0.02), spread(1, 0.01), 2),
      "020": body(0.8, 0.04, spread(0.05, 0.001)),
      "030": share(0.1, ["010", "020"], 0.01),
      "040": share(0.2, ["030"], null),
    });
    const linear = uncertaintyOf(state);
    const result = drawn(state, DRAWS, 5);
    expectRelative(result.basic.standardDeviation, linear.basic.standardUncertainty, 0.02);
  });

  it("gives the same answer to the last digit from the same seed, and another from another", () => {
    const state = sideFairing();
    expect(drawn(state, 3000, 42)).toEqual(drawn(state, 3000, 42));
    expect(drawn(state, 3000, 42).basic.mean).not.toBe(drawn(state, 3000, 43).basic.mean);
  });

  it("leaves a budget as it was", () => {
    const state = supplyDuct();
    const before = JSON.stringify(state);
    drawn(state, 1000, 1);
    expect(JSON.stringify(state)).toBe(before);
  });

  it("has the mean of the square of a normal speed, which first order has not", () => {
    const speed = spread(10, 2);
    const state = budget({ "010": body(1, null, { value: 1 }) }, { point: { ...STILL, speed } });
    // E[U²] = μ² + σ²; the bias of the coefficient has mean 1. The standard error is some 0.3 %.
    expectRelative(drawn(state, DRAWS, 3).basic.mean, 0.5 * (100 + 4), 0.01);
    expectRelative(uncertaintyOf(state).basic.value, 50, 1e-11);
  });
});

describe("what a quantity cannot be", () => {
  it("is not drawn: a force of 1 N ± 1 N has the moments of the normal distribution cut off at 0", () => {
    const result = drawn(budget({ "010": fixed(spread(1, 1)) }, { point: STILL }), DRAWS, 9);
    // Cut off at −1 deviation: mean 1 + φ(1)/Φ(1), φ(1) = 0.241970724519, Φ(1) = 0.841344746069.
    expectRelative(result.basic.mean, 1 + 0.241970724519 / 0.841344746069, 0.015);
    expect(result.basic.low95).toBeGreaterThan(0);
  });

  it("is not drawn of a saving either, which stays one", () => {
    const result = drawn(budget({ "010": fixed(spread(-1, 1), { saving: true }) }, { point: STILL }), 5000, 9);
    expect(result.basic.high95).toBeLessThan(0);
  });

  it("is counted where a method refuses what was drawn, and left out of the moments", () => {
    // Re 1000 is the least that any line stands for: 1 % longer or shorter falls below it half of the time.
    const state = budget({ "010": plate(spread(1.0000001e-3, 1e-5), { value: 1 }, 1) }, { point: STILL });
    const { refusedDraws, draws, basic } = drawn(state, 4000, 2);
    expect(refusedDraws / draws).toBeGreaterThan(0.46);
    expect(refusedDraws / draws).toBeLessThan(0.54);
    expect(Number.isFinite(basic.mean)).toBe(true);
  });
});

describe("a run", () => {
  const state = budget({ "010": fixed(spread(1, 0.1)) }, { point: STILL });

  it("tells its progress up to the last draw", () => {
    const told: number[] = [];
    monteCarlo(state, "OP-1", { draws: 1750, seed: 1, onProgress: (done) => told.push(done) });
    expect(told.at(-1)).toBe(1750);
    expect(told).toEqual([...told].sort((one, other) => one - other));
  });

  it("breaks off when it is cancelled, with no result", () => {
    let asked = 0;
    const cancelled = (): boolean => (asked += 1) === 2;
    expect(monteCarlo(state, "OP-1", { draws: 100_000, seed: 1, cancelled })).toBeNull();
    expect(asked).toBe(2);
  });

  it("gives in batches what it gives at once", () => {
    const batches = monteCarloBatches(state, "OP-1", { draws: 2000, seed: 8 });
    let step = batches.next();
    while (!step.done) step = batches.next();
    expect(step.value).toEqual(drawn(state, 2000, 8));
  });

  it("names the items that have no result", () => {
    const refused = budget({ "010": plate({ value: 1e-4 }, { value: 1 }, 1) });
    expect(monteCarlo(refused, "OP-1", { draws: 1000, seed: 1 })).toEqual({ operatingPoint: "OP-1", refused: ["010"] });
  });

  it("is refused for an unknown point and for a number of draws that says nothing", () => {
    expect(() => monteCarlo(state, "OP-9", { draws: 1000, seed: 1 })).toThrow(RangeError);
    for (const draws of [0, 999, 1000.5, 1e9]) {
      expect(() => drawModel(modelOf(state), { draws, seed: 1 }).next()).toThrow(RangeError);
    }
  });
});
