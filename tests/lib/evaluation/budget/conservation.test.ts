import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { applyEdits } from "@/lib/evaluation/budget/apply-edits";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { ALLOCATED, of, retire, revise, sheetOf, UNALLOCATED } from "./allocation-fixture";

/** Counts again from the rows and the tree alone, without the product's code. */
function recount(state: BudgetState): { sum: number; ceilingsKept: boolean } {
  const parents = new Map<string, string | null>();
  for (const line of state.lines) {
    if (line.kind === "item") parents.set(line.number, line.body.group);
    if (line.kind === "group") parents.set(line.number, line.body.parent);
  }
  const { rows, unallocatedHundredths } = sheetOf(state).body;
  const held = new Map(rows.map(({ number, hundredths }) => [number, hundredths]));
  const ceilingOver = (number: string): string | null => {
    for (let up = parents.get(number) ?? null; up !== null; up = parents.get(up) ?? null) if (held.has(up)) return up;
    return null;
  };
  let sum = unallocatedHundredths;
  const inside = new Map<string, number>();
  for (const [number, hundredths] of held) {
    const ceiling = ceilingOver(number);
    if (ceiling === null) sum += hundredths;
    else inside.set(ceiling, (inside.get(ceiling) ?? 0) + hundredths);
  }
  const ceilingsKept = [...inside].every(([group, within]) => within <= (held.get(group) ?? 0));
  return { sum, ceilingsKept };
}

describe("conservation", () => {
  const holders = ["010", "020", "030", "040", "050", "G10", "G20"].map(of);
  const holder = fc.constantFrom(...holders, UNALLOCATED);
  const transfers = fc.array(
    fc.record({ giver: holder, receiver: holder, hundredths: fc.integer({ min: 1, max: 3000 }) }),
    { maxLength: 6 },
  );
  const edits = fc.subarray([
    retire("item", "010"),
    retire("item", "050"),
    revise("item", "020", { group: null }),
    revise("item", "040", { group: "G20" }),
    revise("group", "G20", { parent: null }),
    revise("operating_point", "OP-1", { limitHundredths: 12345 }),
    revise("terms", "TM", { referenceOperatingPoint: "OP-2" }),
  ]);

  it("holds to 0.01 N after any change, and a change without shortfall keeps every ceiling and unallocated at 0 or more", () => {
    let sound = 0;
    fc.assert(
      fc.property(edits, transfers, (someEdits, someTransfers) => {
        const { state, shortfall, faults } = applyEdits(ALLOCATED, someEdits, someTransfers);
        const usesSecond = someEdits.some(({ kind }) => kind === "terms");
        const limit = usesSecond ? 8000 : someEdits.some(({ kind }) => kind === "operating_point") ? 12345 : 10000;
        const { sum, ceilingsKept } = recount(state);
        expect(sum).toBe(limit - (usesSecond ? 100 : 500));
        if (shortfall !== null || faults.length > 0) return;
        sound += 1;
        expect(ceilingsKept).toBe(true);
        const { rows, unallocatedHundredths } = sheetOf(state).body;
        expect(unallocatedHundredths).toBeGreaterThanOrEqual(0);
        expect(rows.every(({ number, hundredths }) => (number === "050" ? hundredths <= 0 : hundredths >= 0))).toBe(
          true,
        );
      }),
      { numRuns: 1000 },
    );
    expect(sound).toBeGreaterThan(50);
  });
});
