import { describe, expect, it } from "vitest";
import { allocationsLayout } from "@/app/(workspace)/products/[productCode]/_pictures/allocations-layout";

const row = (number: string, basic: number, predicted: number, allocationHundredths: number | null) => ({
  ...{ number, name: "Item", basic, predicted, allocationHundredths },
  marginHundredths: allocationHundredths === null ? null : allocationHundredths - Math.round(predicted * 100),
});

describe("items against their allocations", () => {
  const { rows, scale } = allocationsLayout([
    row("010", 10, 12, 1500),
    row("020", 20, 24, 2200),
    row("030", 5, 6, null),
    row("040", -4, -3, -500),
  ]);

  it("draws basic solid from zero and growth behind it, all on one ruler that holds every post", () => {
    expect(rows[0]).toMatchObject({ solid: { from: 0, to: 10 }, growth: { from: 10, to: 12 }, over: null });
    expect(scale.min).toBe(-5);
    expect(scale.max).toBeGreaterThan(24);
  });

  it("draws what goes beyond an allocation, a saving that gives less than it promised among it", () => {
    expect(rows[1]).toMatchObject({ over: { from: 22, to: 24 }, margin: -2 });
    expect(rows[3]).toMatchObject({
      solid: { from: -3, to: 0 },
      growth: { from: -4, to: -3 },
      over: { from: -5, to: -3 },
      margin: -2,
    });
  });

  it("has no post and no margin where there is no allocation", () => {
    expect(rows[2]).toMatchObject({ allocation: null, margin: null, over: null });
  });
});
