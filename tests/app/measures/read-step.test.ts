import { describe, expect, it } from "vitest";
import { readStep } from "@/app/(workspace)/products/[productCode]/_workings/read-step";
import type { MeasureBasis } from "@/lib/evaluation/measures/measure-basis";
import { readingOf } from "@/lib/evaluation/measures/reading";
import type { Measure } from "@/lib/vocabulary/measures";

/** The demo's fairing at 25 m/s: q = 382.8 Pa, 10 m², a count of 0.001, 2600 hours a year. */
const BASIS: MeasureBasis = {
  ...{ kind: "vehicle_fairing", countSize: 0.001, referenceArea: 10, flowArea: null },
  ...{ dynamicPressure: 382.8, speed: 25, hoursPerYear: 2600 },
};

function stepOf(measure: Measure, units: "si" | "us" = "si") {
  const reading = readingOf(measure, BASIS, units);
  return reading && readStep(reading, BASIS, 61.59);
}

describe("the end of a working in another measure", () => {
  it("shows formula and numbers with which a hand calculator comes to the value read", () => {
    const printed = ["drag-area", "counts", "power", "energy"] as const;
    const steps = printed.map((measure) => stepOf(measure));
    expect(steps.map((step) => [step?.formula, step?.withValues])).toEqual([
      ["C_D A = D/q", "61.59 / 382.8"],
      ["n = D/(q · A · c)", "61.59 / (382.8 · 10 · 0.001)"],
      ["P = D · U", "61.59 · 25.00"],
      ["E = D · U · h/1000", "61.59 · 25.00 · 2600/1000"],
    ]);
    const byHand = [61.59 / 382.8, 61.59 / (382.8 * 10 * 0.001), 61.59 * 25, (61.59 * 25 * 2600) / 1000];
    steps.forEach((step, at) => {
      expect(Number(step?.value.replace("\u2009", "")) / (byHand[at] ?? NaN)).toBeCloseTo(1, 3);
    });
    expect(steps[1]).toMatchObject({ unit: "counts", source: "1 count = 0.001 on 10.00\u2009m²" });
  });

  it("adds nothing to newtons, which are kept, and converts them for a reader of US customary units", () => {
    expect(stepOf("newtons")).toBeNull();
    // 1 lbf = 4.4482216 N (NIST SP 811).
    expect(stepOf("newtons", "us")).toMatchObject({ unit: "lbf", withValues: "61.59 / 4.448222" });
    expect(Number(stepOf("newtons", "us")?.value)).toBeCloseTo(61.59 / 4.4482216, 2);
  });

  it("has none for what the product lacks", () => {
    expect(stepOf("pascals")).toBeNull();
  });
});
