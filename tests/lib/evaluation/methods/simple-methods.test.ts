import { describe, expect, it } from "vitest";
import { expectRelative } from "@/tests/support/relative";
import { AIR, answerOf, evaluateItems, PLAIN } from "./evaluate-one";

describe("methods without friction", () => {
  it("a loss coefficient: pressure loss K·q and force K·q·A at the local speed", () => {
    const item = { method: "loss-coefficient", lossCoefficient: 0.4, flowArea: 3, localSpeedRatio: 2 };
    // q = ½·1·(2·10)² = 200 Pa.
    expect(answerOf(PLAIN, item)).toMatchObject({ pressureLoss: 80, drag: 240 });
  });

  it("a bluff body: q·C_D·A·shelter, and its drag area at the point's own speed", () => {
    const item = {
      method: "bluff-body",
      dragCoefficient: 1.1,
      referenceArea: 0.5,
      shelterFactor: 0.4,
      localSpeedRatio: 2,
    };
    const { drag, dragArea } = answerOf(PLAIN, item);
    expectRelative(drag, 200 * 1.1 * 0.5 * 0.4, 1e-14);
    expectRelative(dragArea, 0.88, 1e-14);
  });

  it("a drag area, and a saving of one", () => {
    expectRelative(answerOf(PLAIN, { method: "drag-area", dragArea: 0.3 }).drag, 15, 1e-14);
    expectRelative(answerOf(PLAIN, { method: "drag-area", dragArea: -0.1, saving: true }).drag, -5, 1e-14);
  });

  it("a measured force goes with dynamic pressure from the test to each point", () => {
    const testPoint = { ...PLAIN, speed: 8 };
    const { drag } = answerOf(PLAIN, { method: "measured", force: 6.4, testPoint });
    expectRelative(drag, 10, 1e-14);
  });

  it("a fixed force is the same at every point", () => {
    for (const point of [PLAIN, AIR]) expect(answerOf(point, { method: "fixed", force: 7.25 }).drag).toBe(7.25);
  });

  it("leaves out what a method does not have", () => {
    const keys = Object.keys(answerOf(PLAIN, { method: "fixed", force: 1 })).sort();
    expect(keys).toEqual(["drag", "id", "notes", "standardUncertainty"]);
    const loss = answerOf(PLAIN, { method: "loss-coefficient", lossCoefficient: 1, flowArea: 1 });
    expect(loss).not.toHaveProperty("reynolds");
  });

  it("gives a share of the sum of its members, savings with their sign", () => {
    const items = evaluateItems(PLAIN, [
      { method: "fixed", force: 10 },
      { method: "fixed", force: -4, saving: true },
      { method: "share", fraction: 0.5, of: ["item-0", "item-1"] },
      { method: "share", fraction: 0.1, of: ["item-2"] },
    ]);
    expect(items.map((item) => ("drag" in item ? item.drag : null))).toEqual([10, -4, 3, expect.closeTo(0.3, 12)]);
  });
});
