import { describe, expect, it } from "vitest";
import { intervalLayout, type BellPoint } from "@/app/(workspace)/products/[productCode]/_pictures/interval-layout";
import { fractionOf } from "@/app/(workspace)/products/[productCode]/_pictures/scale";

const INPUT = {
  basic: { value: 50, standardUncertainty: 2, low95: 46.08, high95: 53.92 },
  predicted: { value: 56, standardUncertainty: 4 },
  limit: 60,
  drawn: null,
};

/** By the trapezoidal rule. */
function areaOf(points: readonly BellPoint[]): number {
  return points.reduce((sum, { x, y }, at) => {
    const before = points[at - 1];
    return before ? sum + ((x - before.x) * (y + before.y)) / 2 : 0;
  }, 0);
}

describe("the picture of an interval", () => {
  const layout = intervalLayout(INPUT);
  const at = (newtons: number) => fractionOf(layout.scale, newtons);

  it("draws both totals as normal distributions of one area, the narrower one higher", () => {
    const peak = (points: BellPoint[]) => points.reduce((top, point) => (point.y > top.y ? point : top));
    expect(peak(layout.basic)).toEqual({ x: expect.closeTo(at(50), 6), y: expect.closeTo(1, 6) });
    expect(peak(layout.predicted)).toEqual({ x: expect.closeTo(at(56), 6), y: expect.closeTo(0.5, 6) });
    expect(areaOf(layout.basic) / areaOf(layout.predicted)).toBeCloseTo(1, 4);
  });

  it("marks of ΣB + ΣG the part that lies beyond the limit", () => {
    expect(layout.over[0]?.x).toBeCloseTo(at(60), 9);
    // One standard uncertainty away: 15.87 % of a normal distribution lie beyond it (any table of Φ).
    expect(areaOf(layout.over) / areaOf(layout.predicted)).toBeCloseTo(0.1587, 2);
    expect(intervalLayout({ ...INPUT, limit: 90 }).over).toEqual([]);
  });

  it("holds everything that is drawn, a limit far off and the ends of a run too", () => {
    for (const input of [INPUT, { ...INPUT, limit: 200 }, { ...INPUT, limit: 10, drawn: { low95: 20, high95: 90 } }]) {
      const { basic, predicted, over, scale } = intervalLayout(input);
      for (const { x, y } of [...basic, ...predicted, ...over]) {
        expect(x).toBeGreaterThanOrEqual(0);
        expect(x).toBeLessThanOrEqual(1);
        expect(y).toBeGreaterThan(0);
        expect(y).toBeLessThanOrEqual(1);
      }
      for (const newtons of [input.limit, input.drawn?.low95 ?? 50, input.drawn?.high95 ?? 50]) {
        expect(newtons).toBeGreaterThan(scale.min);
        expect(newtons).toBeLessThan(scale.max);
      }
    }
  });
});
