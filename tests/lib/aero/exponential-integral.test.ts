import { describe, expect, it } from "vitest";
import { exponentialIntegral } from "@/lib/aero/numerics/exponential-integral";
import { risingRoot } from "@/lib/aero/numerics/rising-root";
import { integrate } from "@/tests/support/integrate";
import { expectRelative } from "@/tests/support/relative";

describe("the exponential integral", () => {
  it.each([
    [0.5, 0.4542199048631736],
    [1, 1.895117816355937],
    [2, 4.954234356001891],
    [10, 2492.228976241877],
  ])("of %f is tabulated as %f (Abramowitz & Stegun, tables 5.1 and 5.2)", (z, value) => {
    expectRelative(exponentialIntegral(z), value, 1e-14);
  });

  it("grows by ∫ e^t/t dt, also across the change from one series to the other", () => {
    for (const [from, to] of [
      [3, 9],
      [35, 39.9],
      [39.9, 40.1],
      [40, 44],
    ] as const) {
      // In units of e^to, so that the integrator's tolerance is relative.
      const [growth = NaN] = integrate((t) => [Math.exp(t - to) / t], from, [0], to);
      const difference = exponentialIntegral(to) - exponentialIntegral(from);
      expectRelative(difference / Math.exp(to), growth, 1e-10, `${from} to ${to}`);
    }
  });

  it("refuses what has no value", () => {
    expect(() => exponentialIntegral(0)).toThrow(RangeError);
  });
});

describe("the root of a rising function", () => {
  it("is found to the last digit", () => {
    expect(risingRoot((x) => x * x - 2, 1, 2)).toBeCloseTo(Math.SQRT2, 15);
    expect(risingRoot((x) => x - 0.1, 0, 1)).toBe(0.1);
  });
});
