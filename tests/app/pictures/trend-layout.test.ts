import { describe, expect, it } from "vitest";
import { trendLayout } from "@/app/(workspace)/products/[productCode]/_pictures/trend-layout";

const issues = [
  { issue: 1, at: "2026-01-01T00:00:00.000Z", basic: 80, predicted: 100, limit: 120, reserve: 10 },
  { issue: 2, at: "2026-03-01T00:00:00.000Z", basic: 90, predicted: 105, limit: 120, reserve: 10 },
];
const until = "2026-05-01T00:00:00.000Z";

describe("the trend over issues", () => {
  it("holds a value until the next issue, and the last one until the end", () => {
    const { predicted } = trendLayout(issues, [], until);

    expect(predicted.map(({ x }) => x)).toEqual([0, 59 / 120, 59 / 120, 1]);
    expect(predicted[0]?.y).toBe(predicted[1]?.y);
    expect(predicted[2]?.y).toBeGreaterThan(predicted[1]?.y ?? Infinity);
  });

  it("draws the reserve below the limit and no limit where none is set", () => {
    const layout = trendLayout(issues, [], until);
    expect(layout.reserve[0]?.y).toBeLessThan(layout.limit[0]?.y ?? -Infinity);

    const without = issues.map((issue) => ({ ...issue, limit: null }));
    expect(trendLayout(without, [], until)).toMatchObject({ limit: [], reserve: [] });
  });

  it("encloses the planned profile by its tolerance", () => {
    const layout = trendLayout(issues, [{ date: "2026-02-01", predicted: 100, tolerance: 5 }], until);

    expect(layout.plannedBand[0]?.y).toBeGreaterThan(layout.planned[0]?.y ?? Infinity);
    expect(layout.plannedBand.at(-1)?.y).toBeLessThan(layout.planned[0]?.y ?? -Infinity);
  });

  it("names a few whole days along the foot, each once", () => {
    const labels = trendLayout(issues, [], until).dates.map(({ label }) => label);

    expect(labels.length).toBeGreaterThan(1);
    expect(labels.length).toBeLessThanOrEqual(6);
    expect(new Set(labels).size).toBe(labels.length);
  });

  it("can be drawn from a single issue at a single moment", () => {
    const [only] = issues;
    const layout = trendLayout(only ? [only] : [], [], only?.at ?? until);

    expect(layout.marks.every(({ x, y }) => Number.isFinite(x) && Number.isFinite(y))).toBe(true);
  });
});

describe("issues that crowd", () => {
  it("are named where there is room, the newest first", () => {
    const crowd = [0, 1, 2].map((minute) => ({
      ...{ basic: 80, predicted: 100, limit: 120, reserve: 10 },
      issue: minute + 1,
      at: `2026-01-01T00:0${minute}:00.000Z`,
    }));
    const { marks, dates } = trendLayout(crowd, [], "2026-01-02T00:00:00.000Z");

    expect(marks.map(({ labelled }) => labelled)).toEqual([false, false, true]);
    expect(dates.map(({ label }) => label)).toEqual(["2026-01-01 00:00", "2026-01-02 00:00"]);
  });
});

describe("the planned profile in the trend", () => {
  it("is drawn in the order of its dates, and its last row holds up to the end", () => {
    const issues = [{ issue: 1, at: "2026-03-01T00:00:00.000Z", basic: 40, predicted: 50, limit: 100, reserve: 10 }];
    const [late, early] = [
      { date: "2026-03-21", predicted: 40, tolerance: 5 },
      { date: "2026-03-11", predicted: 60, tolerance: 5 },
    ];
    const { planned } = trendLayout(issues, [late, early], "2026-03-31T00:00:00.000Z");
    // Thirty days from the issue to the end.
    expect(planned.map(({ x }) => Math.round(x * 30))).toEqual([10, 20, 30]);
    expect(planned[1]?.y).toBe(planned[2]?.y);
  });
});
