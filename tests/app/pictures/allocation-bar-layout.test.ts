import { describe, expect, it } from "vitest";
import { allocationBarLayout } from "@/app/(workspace)/products/[productCode]/_pictures/allocation-bar-layout";

describe("the small bar against an allocation", () => {
  it("draws basic and growth to the scale of the allocation's post", () => {
    const bar = allocationBarLayout({ basic: 30, predicted: 33, allocation: 40, judged: true });

    expect(bar.post).not.toBeNull();
    expect(bar.basic.to / (bar.post ?? NaN)).toBeCloseTo(30 / 40, 12);
    expect(bar.growth.to / (bar.post ?? NaN)).toBeCloseTo(33 / 40, 12);
    expect(bar.over).toBeNull();
  });

  it("shows what goes over the allocation and keeps it within the bar", () => {
    const bar = allocationBarLayout({ basic: 90, predicted: 100, allocation: 40, judged: true });

    expect(bar.over?.from).toBeCloseTo(0.4, 12);
    expect(bar.over?.to).toBe(1);
  });

  it("calls nothing over where allocations are not set", () => {
    expect(allocationBarLayout({ basic: 90, predicted: 100, allocation: 40, judged: false }).over).toBeNull();
  });

  it("draws no post without an allocation and does not call it over", () => {
    expect(allocationBarLayout({ basic: 5, predicted: 6, allocation: null, judged: true })).toMatchObject({
      post: null,
      over: null,
    });
  });

  it("calls every newton over where the allocation is zero", () => {
    const { over, growth, post } = allocationBarLayout({ basic: 5, predicted: 6, allocation: 0, judged: true });

    expect(over).toEqual({ from: 0, to: growth.to });
    expect(post).toBe(0);
  });

  it("draws a saving by its size, its growth as what is not counted on", () => {
    const bar = allocationBarLayout({ basic: -10, predicted: -8, allocation: -8, judged: true });

    expect(bar.basic.to / (bar.post ?? NaN)).toBeCloseTo(1, 12);
    expect(bar.growth.to).toBeGreaterThan(bar.growth.from);
  });
});
