import { describe, expect, it } from "vitest";
import { hasRefusal } from "@/lib/evaluation/document/answer";
import { evaluateDocument } from "@/lib/evaluation/document/evaluate-document";
import { EvaluationDocument } from "@/lib/evaluation/document/schema";
import { expectRelative } from "@/tests/support/relative";
import { evaluateItems, PLAIN } from "@/tests/lib/evaluation/methods/evaluate-one";
import { EXAMPLE } from "./example";

const evaluate = (document: unknown) => evaluateDocument(EvaluationDocument.parse(document));

describe("the example of the specification", () => {
  const answer = evaluate(EXAMPLE);
  const cruise = answer.operatingPoints[0];

  it("comes out as printed, to the printed digits", () => {
    expect(cruise).toMatchObject({ id: "cruise" });
    const printed: [number | undefined, number, number][] = [
      [cruise?.density, 1.225, 4],
      [cruise?.dynamicViscosity, 1.789e-5, 4],
      [cruise?.kinematicViscosity, 1.461e-5, 4],
      [cruise?.dynamicPressure, 382.8, 4],
      [cruise?.totalDrag, 12.54, 4],
    ];
    const front = cruise?.items[0];
    if (!front || "refused" in front) throw new Error("refused");
    printed.push(
      [front.drag, 5.385, 4],
      [front.reynolds, 4.108e6, 4],
      [front.meanCoefficient, 0.003085, 4],
      [front.localCoefficient, 0.002889, 4],
      [front.transitionAt, 0.2921, 4],
      [front.momentumThickness, 0.003702, 4],
      [front.wallShearStress, 1.106, 4],
      [front.admissibleRoughness, 5.843e-5, 4],
      [front.standardUncertainty, 0.22, 2],
    );
    // The specification rounds; 0.0028885 stands there as 0.002889, so half a unit of the last digit is allowed in full.
    for (const [value = NaN, expected, digits] of printed) {
      const unit = 10 ** (Math.floor(Math.log10(expected)) + 1 - digits);
      expect(Math.abs(value - expected), `${value} as ${expected}`).toBeLessThanOrEqual(0.61 * unit);
    }
    expect(front.frictionLineUsed).toBe("prandtl-schlichting");
    expect(front.roughnessVerdict).toBe("smooth");
  });

  it("answers every point and item in the order given", () => {
    expect(answer.operatingPoints.map(({ id }) => id)).toEqual(["cruise", "tow-tank"]);
    expect(cruise?.items.map(({ id }) => id)).toEqual(["front", "trim", "gaps"]);
    expect(hasRefusal(answer)).toBe(false);
  });
});

const fixed = (id: string, force: number, group?: string) => ({
  id,
  method: "fixed",
  force,
  ...(group ? { group } : {}),
});
const share = (id: string, fields: object) => ({ id, method: "share", fraction: 0.5, ...fields });
const outcome = (items: object[]): Record<string, number | string> =>
  Object.fromEntries(
    evaluateItems(PLAIN, items).map((item) => [item.id, "refused" in item ? item.refused : item.drag]),
  );

describe("shares", () => {
  it("follow their members in whatever order they stand", () => {
    expect(outcome([share("s", { of: ["t", "a"] }), share("t", { of: ["a"] }), fixed("a", 8)])).toEqual({
      s: 6,
      t: 4,
      a: 8,
    });
  });

  it("take a group by its very text", () => {
    const items = [
      fixed("a", 1, "Cab"),
      fixed("b", 2, "Cab › Roof"),
      fixed("c", 4, "cab"),
      share("s", { ofGroup: "Cab" }),
    ];
    expect(outcome(items).s).toBe(0.5);
  });

  it("are refused in a circle, and so is what takes from one, while others are given", () => {
    const result = outcome([
      share("a", { of: ["b"] }),
      share("b", { of: ["c"] }),
      share("c", { of: ["a"] }),
      share("d", { of: ["a", "e"] }),
      fixed("e", 3),
    ]);
    expect(result.a).toMatch(/circle \(a → b → c → a\)/);
    expect(result.b).toMatch(/circle/);
    expect(result.c).toMatch(/circle/);
    expect(result.d).toBe(
      "The share takes from item a, which is refused at this operating point. Settle that item first.",
    );
    expect(result.e).toBe(3);
  });

  it("are a circle by themselves: of itself, or in the group that it names", () => {
    expect(outcome([share("a", { of: ["a"] })]).a).toMatch(/circle \(a → a\)/);
    expect(outcome([fixed("x", 1, "g"), { ...share("a", { ofGroup: "g" }), group: "g" }]).a).toMatch(/circle/);
  });

  it("of a refused item are refused at that point alone, which has no total", () => {
    const answer = evaluate({
      operatingPoints: [
        { id: "slow", ...PLAIN, speed: 0.001 },
        { id: "fast", ...PLAIN },
      ],
      items: [
        { id: "plate", method: "flat-plate-friction", length: 1, breadth: 1, faces: 1 },
        fixed("other", 2),
        share("gaps", { of: ["plate"] }),
        share("more", { of: ["gaps"] }),
      ],
    });
    const [slow, fast] = answer.operatingPoints;
    expect(slow?.items.map((item) => "refused" in item)).toEqual([true, false, true, true]);
    expect(Object.keys(slow?.items[0] ?? {})).toEqual(["id", "refused"]);
    expect(slow).not.toHaveProperty("totalDrag");
    expect(fast?.items.some((item) => "refused" in item)).toBe(false);
    const sum = fast?.items.reduce((total, item) => total + ("drag" in item ? item.drag : NaN), 0);
    expectRelative(fast?.totalDrag, sum ?? NaN, 1e-14);
    expect(hasRefusal(answer)).toBe(true);
  });

  it("in a long chain are evaluated all the same", () => {
    const chain = Array.from({ length: 2000 }, (_, i) =>
      share(`s${i}`, { fraction: 1, of: [i === 1999 ? "a" : `s${i + 1}`] }),
    );
    expect(outcome([...chain, fixed("a", 2)]).s0).toBe(2);
  });
});
