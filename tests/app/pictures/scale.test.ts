import { describe, expect, it } from "vitest";
import { percent, rulerTicks } from "@/app/(workspace)/products/[productCode]/_pictures/scale";
import { NEWTONS, readTick } from "@/lib/evaluation/measures/reading";

describe("the ruler", () => {
  it("steps by 1, 2 or 5 times a power of ten", () => {
    expect(rulerTicks({ min: 0, max: 310 })).toEqual([0, 50, 100, 150, 200, 250, 300]);
    expect(rulerTicks({ min: 0, max: 0.8 })).toEqual([0, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8]);
    expect(rulerTicks({ min: -25, max: 120 })).toEqual([-20, 0, 20, 40, 60, 80, 100, 120]);
  });

  it("never draws more ticks than one above what was asked", () => {
    for (let max = 0.013; max < 1e6; max *= 1.37) expect(rulerTicks({ min: 0, max }, 8).length).toBeLessThanOrEqual(9);
  });

  it("has round values of the measure that is read, and prints them round", () => {
    // NIST SP 811 (2008), B.8: 1 lbf = 4.4482216152605 N exactly.
    const pounds = { ...NEWTONS, perNewton: 1 / 4.4482216152605, unit: "lbf" };
    const ticks = rulerTicks({ min: 0, max: 70 }, 8, pounds.perNewton);
    expect(ticks.map((tick) => readTick(pounds, tick))).toEqual(["0", "2", "4", "6", "8", "10", "12", "14"]);
    expect(ticks[1]).toBeCloseTo(8.896443230521, 9);
  });

  it("writes fractions as percentages a style attribute accepts", () => {
    expect(percent(1 / 3)).toBe("33.3333%");
    expect(percent(0)).toBe("0%");
  });
});
