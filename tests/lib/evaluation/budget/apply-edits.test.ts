import { describe, expect, it } from "vitest";
import { applyEdits } from "@/lib/evaluation/budget/apply-edits";
import { add, FIXED, retire, revise, STATE } from "./edit-fixture";

describe("edits that hold together", () => {
  it("give each line its next letter at the next issue and leave the others as they were", () => {
    const { state, faults, changedLines } = applyEdits(
      STATE,
      [revise("item", "010", { faces: 1 }), add("item", "040", FIXED), retire("item", "030")],
      [],
    );
    expect(faults).toEqual([]);
    expect(changedLines.map(({ number, letter, issue, retired }) => [number, letter, issue, retired])).toEqual([
      ["010", "A", 2, false],
      ["040", "–", 2, false],
      ["030", "A", 2, true],
    ]);
    expect(state.lines.find(({ number }) => number === "020")).toEqual(
      STATE.lines.find(({ number }) => number === "020"),
    );
    expect(STATE.lines.find(({ number }) => number === "010")?.letter).toBe("–");
  });

  it("count a revision that says the same for none", () => {
    expect(applyEdits(STATE, [revise("item", "010", {})], []).changedLines).toEqual([]);
  });

  it("bring a retired line back with a letter, as it was or as it is typed", () => {
    const { state } = applyEdits(STATE, [retire("item", "030")], []);
    const back = { operation: "reinstate", kind: "item", number: "030", baseLetter: "A" } as const;
    const same = applyEdits(state, [{ ...back, body: null }], []);
    expect(same.changedLines).toMatchObject([
      { number: "030", letter: "B", retired: false, body: { force: { value: 4 } } },
    ]);
    const other = applyEdits(state, [{ ...back, body: { ...FIXED, force: { value: 5 } } }], []);
    expect(other.changedLines).toMatchObject([{ letter: "B", body: { force: { value: 5 } } }]);
  });

  it("may lean on one another", () => {
    const { faults } = applyEdits(
      STATE,
      [
        add("group", "G30", { name: "Floor", order: 30 }),
        add("item", "040", { ...FIXED, group: "G30" }),
        revise("item", "090", { of: ["040"] }),
        retire("item", "020"),
        retire("item", "010"),
      ],
      [],
    );
    expect(faults).toEqual([]);
  });
});
