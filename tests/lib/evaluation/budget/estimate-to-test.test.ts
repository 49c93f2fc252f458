import { describe, expect, it } from "vitest";
import {
  type EstimateAndTest,
  growthOf,
  growthStatistics,
  LEAST_PAIRS,
  suggestGrowth,
} from "@/lib/evaluation/budget/estimate-to-test";
import type { MaturityGrade } from "@/lib/vocabulary/grades";
import { DEFAULT_GROWTH_TABLE } from "@/lib/evaluation/lines/terms-body";

function pair(estimate: number, measured: number, grade: MaturityGrade = "estimated"): EstimateAndTest {
  const at = { estimateIssue: 2, measuredIssue: 3 };
  return { item: "010", name: "Lamp", grade, method: "bluff-body", estimate, measured, ...at };
}

/** Growths of 10, 20, 30, 40 and 50 %: mean 30 %, sample variance (0.04 + 0.01 + 0 + 0.01 + 0.04) / 4 = 0.025. */
const FIVE = [11, 12, 13, 14, 15].map((measured) => pair(10, measured));

describe("growth from estimate to test", () => {
  it("is referred to the size of the estimate, also of a saving", () => {
    expect(growthOf({ estimate: 10, measured: 12 })).toBeCloseTo(0.2, 12);
    expect(growthOf({ estimate: -10, measured: -8 })).toBeCloseTo(0.2, 12);
  });

  it("has mean, sample standard deviation and extremes", () => {
    const statistics = growthStatistics(FIVE);
    expect(statistics).toMatchObject({ pairs: 5, least: expect.closeTo(0.1, 12), greatest: expect.closeTo(0.5, 12) });
    expect(statistics?.mean).toBeCloseTo(0.3, 12);
    expect(statistics?.deviation).toBeCloseTo(Math.sqrt(0.025), 12);
  });

  it("has no deviation of one pair and nothing of none", () => {
    expect(growthStatistics([pair(10, 12)])?.deviation).toBeNull();
    expect(growthStatistics([])).toBeNull();
  });
});

describe("the growth table that tests suggest", () => {
  const suggested = (pairs: readonly EstimateAndTest[], grade: MaturityGrade) =>
    suggestGrowth(pairs, DEFAULT_GROWTH_TABLE).find((row) => row.grade === grade);

  it("takes the mean of a grade from enough pairs, beside what is in force", () => {
    expect(FIVE).toHaveLength(LEAST_PAIRS);
    expect(suggested(FIVE, "estimated")).toMatchObject({ present: 0.2, suggested: 0.3 });
  });

  it("suggests nothing from one pair fewer, nor for another grade", () => {
    expect(suggested(FIVE.slice(1), "estimated")).toMatchObject({ statistics: { pairs: 4 }, suggested: null });
    expect(suggested(FIVE, "layout")).toMatchObject({ statistics: null, suggested: null });
  });

  it("rounds up to a whole per cent, and never suggests that drag shrinks", () => {
    const growing = [10.01, 10, 10, 10, 10].map((measured) => pair(10, measured));
    expect(suggested(growing, "estimated")?.suggested).toBe(0.01);
    expect(
      suggested(
        [9, 9, 9, 9, 9].map((measured) => pair(10, measured)),
        "estimated",
      )?.suggested,
    ).toBe(0);
  });

  it("has a row for every grade that is an estimate, and none for the measured ones", () => {
    expect(suggestGrowth([], DEFAULT_GROWTH_TABLE).map(({ grade }) => grade)).toEqual([
      "estimated",
      "layout",
      "preliminary",
      "released",
    ]);
  });
});
