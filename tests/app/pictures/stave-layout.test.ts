import { describe, expect, it } from "vitest";
import { fractionOf } from "@/app/(workspace)/products/[productCode]/_pictures/scale";
import { type StaveInput, staveLayout } from "@/app/(workspace)/products/[productCode]/_pictures/stave-layout";

const fairing: StaveInput = {
  items: [
    { number: "010", name: "Panel", basic: 60 },
    { number: "020", name: "Edge", basic: 30 },
    { number: "030", name: "Gaps", basic: 10 },
  ],
  basic: 100,
  growth: 12,
  predicted: 112,
  limit: 120,
  reserve: 10,
};

describe("the stave", () => {
  it("lays the items end to end from zero, then the growth up to the predicted total", () => {
    const layout = staveLayout(fairing);

    expect(layout.segments.map(({ number, from, to }) => [number, from, to])).toEqual([
      ["010", 0, 60],
      ["020", 60, 90],
      ["030", 90, 100],
    ]);
    expect(layout.growth).toEqual({ from: 100, to: 112 });
  });

  it("puts the reserve's post where the reserve begins and draws nothing as over while inside the limit", () => {
    const layout = staveLayout(fairing);

    expect(layout.limit).toBe(120);
    expect(layout.reserveFrom).toBe(110);
    expect(layout.over).toBeNull();
  });

  it("marks what lies beyond the limit, and only that", () => {
    expect(staveLayout({ ...fairing, limit: 105 }).over).toEqual({ from: 105, to: 112 });
    expect(staveLayout({ ...fairing, limit: 112 }).over).toBeNull();
  });

  it("starts left of zero by what savings give back, so that the solid end still stands at the sum", () => {
    const withSaving = {
      ...fairing,
      items: [...fairing.items, { number: "040", name: "Skirt", basic: -25 }],
      basic: 75,
      predicted: 87,
    };
    const layout = staveLayout(withSaving);

    expect(layout.savings).toEqual({ from: -25, to: 0 });
    expect(layout.segments[0]?.from).toBe(-25);
    expect(layout.segments.at(-1)?.to).toBe(75);
    expect(layout.scale.min).toBe(-25);
  });

  it("keeps every value within the picture and in proportion", () => {
    const layout = staveLayout(fairing);
    const at = (value: number) => fractionOf(layout.scale, value);

    expect(at(120)).toBeLessThan(1);
    expect(at(0)).toBe(0);
    expect(at(60) - at(30)).toBeCloseTo(at(30) - at(0), 12);
    expect(layout.ticks.every((tick) => at(tick) >= 0 && at(tick) <= 1)).toBe(true);
  });

  it("can be drawn before there is a limit or an item", () => {
    const layout = staveLayout({ items: [], basic: 0, growth: 0, predicted: 0, limit: null, reserve: 0 });

    expect(layout.segments).toEqual([]);
    expect(layout.reserveFrom).toBeNull();
    expect(layout.scale.max).toBeGreaterThan(layout.scale.min);
  });
});
