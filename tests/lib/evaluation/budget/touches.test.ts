import { describe, expect, it } from "vitest";
import { adoptedVersion } from "@/lib/evaluation/budget/adopted-versions";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { previewChange } from "@/lib/evaluation/budget/preview-change";
import { touchesOf } from "@/lib/evaluation/budget/touches";
import { touchSentence, touchTitle } from "@/lib/proposals/review/touch-text";
import { retire, revise, STATE } from "./edit-fixture";

const FROZEN = evaluateBudget(STATE);

function changeBy(...edits: Parameters<typeof touchesOf>[2]) {
  const { after, effects } = previewChange(STATE, FROZEN, edits, []);
  return { touches: touchesOf(STATE, after.state, edits), effects, after };
}

describe("what a change touches", () => {
  it("is every item that has a changed finish, moved or not", () => {
    // 6 µm and 20 µm are both below 100 ν/U = 58 µm at 25 m/s: smooth as before, so that nothing moves.
    const { touches, effects } = changeBy(revise("finish", "F10", { roughness: { value: 20e-6 } }));
    expect(touches).toEqual([{ by: "finish", number: "F10", name: "paint", items: ["010", "020"] }]);
    expect(touches.map((touch) => `${touchTitle(touch)} ${touchSentence(touch, effects.items)}`)).toEqual([
      "Finish F10 paint is on 2 items: 010, 020. None of them moves by 0.01 N or more.",
    ]);
  });

  it("says who of them moves", () => {
    const { touches, effects } = changeBy(revise("finish", "F10", { roughness: { value: 900e-6 } }));
    expect(touches.map((touch) => touchSentence(touch, effects.items))).toEqual([
      "is on 2 items: 010, 020. All of them move.",
    ]);
  });

  it("is nothing where nobody has the finish", () => {
    const { touches, effects } = changeBy(retire("finish", "F20"));
    expect(touches.map((touch) => touchSentence(touch, effects.items))).toEqual([
      "is on no item: nothing moves by it.",
    ]);
  });

  it("is every item that gets another version of its method", () => {
    const adopting = ["010", "020"].map((number) => revise("item", number, { methodVersion: 2 }));
    const { touches, after } = changeBy(...adopting);
    expect(touches).toEqual([
      { by: "method-version", method: "flat-plate-friction", version: 2, items: ["010", "020"] },
    ]);
    expect(adoptedVersion(STATE, "flat-plate-friction")).toBe(1);
    expect(adoptedVersion(after.state, "flat-plate-friction")).toBe(2);
    expect(adoptedVersion(after.state, "duct-entry")).toBe(1);
  });

  it("is not an item that changes its method, nor one whose other fields change", () => {
    const { touches } = changeBy(revise("item", "010", { faces: 1 }), revise("item", "030", { force: { value: 5 } }));
    expect(touches).toEqual([]);
  });
});
