import { describe, expect, it } from "vitest";
import { effectReadings, effectText, movesBasis, readingAt } from "@/app/(workspace)/_measures/effect-readings";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { previewChange } from "@/lib/evaluation/budget/preview-change";
import { effectBases } from "@/lib/evaluation/measures/effect-bases";
import { revise, STATE } from "@/tests/lib/evaluation/budget/edit-fixture";

const COUNTS = { measure: "counts", units: "si" } as const;
const DRAG_AREA = { measure: "drag-area", units: "si" } as const;
const before = { state: STATE, results: evaluateBudget(STATE) };
const changeBy = (...edits: Parameters<typeof previewChange>[2]) =>
  previewChange(STATE, before.results, edits, []).after;

/** Air at 15 °C and 101 325 Pa (ISO 2533), q = ½ρU². */
const q = (speed: number) => 0.5 * 1.225 * speed ** 2;

describe("the effects of a change in another measure", () => {
  it("are read by the stream of their operating point, with the sign always", () => {
    const readings = effectReadings(
      DRAG_AREA,
      effectBases(before, changeBy(revise("item", "030", { force: { value: 5 } }))),
    );
    expect(readings).toMatchObject({ unit: "m²", isKept: false });
    const moved = { was: 10, now: 9, delta: -1 };
    expect(Number(effectText(readingAt(readings, "OP-1"), moved, false).replace("−", "-"))).toBeCloseTo(-1 / q(25), 4);
    expect(Number(effectText(readingAt(readings, "OP-2"), moved, false).replace("−", "-"))).toBeCloseTo(-1 / q(12), 3);
    expect(effectText(readingAt(readings, "OP-1"), { was: 10, now: 11, delta: 1 }, true)).toMatch(
      /^\+0\.00\d+\u2009m²$/,
    );
  });

  it("read each side by its own stream where the change moves it, so that a mere change of speed moves no drag area", () => {
    const faster = changeBy(revise("operating_point", "OP-1", { speed: { value: 30 } }));
    const readings = effectReadings(DRAG_AREA, effectBases(before, faster));
    const reading = readingAt(readings, "OP-1");
    expect(movesBasis(reading)).toBe(true);
    expect(movesBasis(readingAt(readings, "OP-2"))).toBe(false);
    // A body of constant drag area: its force goes with q, and nothing else of it moves.
    const moved = { was: 0.5 * q(25), now: 0.5 * q(30), delta: 0.5 * (q(30) - q(25)) };
    expect(Math.abs(Number(effectText(reading, moved, false).replace("−", "-")))).toBeLessThan(1e-4);
  });

  it("take what an issue keeps to 12 digits and what is computed anew for the same stream", () => {
    const kept = { ...before, results: structuredClone(before.results) };
    for (const { stream } of kept.results.points)
      stream.dynamicPressure = Number(stream.dynamicPressure.toPrecision(12));
    const readings = effectReadings(DRAG_AREA, effectBases(kept, before));
    expect(movesBasis(readingAt(readings, "OP-1"))).toBe(false);
  });

  it("stay in newtons, said in every figure, where the terms give the measure nothing to refer to", () => {
    const area = { referenceArea: { value: 10 } };
    const readings = effectReadings(COUNTS, effectBases(before, changeBy(revise("terms", "TM", area))));
    const reading = readingAt(readings, "OP-1");
    expect(readings.unit).toBeNull();
    expect([reading.was.unit, reading.now.unit]).toEqual(["N", "counts"]);
    expect(movesBasis(reading)).toBe(true);
  });
});
