import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { applyEdits } from "@/lib/evaluation/budget/apply-edits";
import { allocationsView } from "@/lib/evaluation/budget/allocations-view";
import type { Holder, LineEdit, TransferEdit } from "@/lib/evaluation/budget/edits";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import type { AllocationRow } from "@/lib/evaluation/lines/allocations-body";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { budgetState } from "@/tests/support/budget-state";

const AIR = {
  name: "Cruise",
  fluid: "air",
  staticTemperature: { value: 288.15 },
  staticPressure: { value: 101325 },
  speed: { value: 25 },
};

function item(group: string | null, newtons = 4) {
  return {
    name: "item",
    ownerId: 1,
    group,
    order: 10,
    grade: "estimated",
    saving: newtons < 0,
    methodVersion: 1,
    method: "fixed",
    force: { value: newtons },
    source: "judgement",
  };
}

/** G10 holds 010 and G20, which holds 020 and 030; 040 and the saving 050 stand alone. */
function stateWith(allocations: AllocationRow[], unallocatedHundredths: number, limitHundredths = 10000): BudgetState {
  return budgetState({
    code: "T-1",
    name: "Test",
    kind: "vehicle_fairing",
    point: AIR,
    otherPoints: { "OP-2": { ...AIR, limitHundredths: 8000 } },
    limitHundredths,
    reserveHundredths: 500,
    terms: {
      reserves: [
        { operatingPoint: "OP-1", hundredths: 500 },
        { operatingPoint: "OP-2", hundredths: 100 },
      ],
    },
    groups: { G10: { name: "Cab", order: 10 }, G20: { name: "Roof", parent: "G10", order: 20 } },
    items: { "010": item("G10"), "020": item("G20"), "030": item("G20"), "040": item(null), "050": item(null, -2) },
    allocations,
    unallocatedHundredths,
  });
}

function row(kind: "item" | "group", number: string, hundredths: number): AllocationRow {
  return { kind, number, hundredths };
}

// 95.00 N can be allocated: 60.00 to the group, 10.00 to 040, −2.00 promised by 050, 27.00 unallocated.
const ALLOCATED = stateWith(
  [
    row("group", "G10", 6000),
    row("item", "010", 2000),
    row("item", "020", 1500),
    row("item", "040", 1000),
    row("item", "050", -200),
  ],
  2700,
);

const UNALLOCATED: Holder = { kind: "unallocated", number: null };
const of = (number: string): Holder => ({ kind: number.startsWith("G") ? "group" : "item", number });
const transfer = (giver: Holder, receiver: Holder, hundredths: number): TransferEdit => ({
  giver,
  receiver,
  hundredths,
});

function sheetOf(state: BudgetState) {
  for (const line of state.lines) if (line.kind === "allocations") return line;
  throw new Error("no sheet");
}

function heldAfter(transfers: TransferEdit[], edits: LineEdit[] = [], start = ALLOCATED) {
  const { state, faults, shortfall } = applyEdits(start, edits, transfers);
  const { rows, unallocatedHundredths } = sheetOf(state).body;
  const held = Object.fromEntries(rows.map(({ number, hundredths }) => [number, hundredths]));
  return { held, unallocated: unallocatedHundredths, faults, shortfall, letter: sheetOf(state).letter };
}

function revise(kind: LineEdit["kind"], number: string, change: object): LineEdit {
  const line = ALLOCATED.lines.find((each) => each.kind === kind && each.number === number);
  return { operation: "revise", kind, number, baseLetter: "–", body: { ...line?.body, ...change } };
}

function retire(kind: LineEdit["kind"], number: string): LineEdit {
  return { operation: "retire", kind, number, baseLetter: "–", body: null };
}

describe("a transfer", () => {
  it("between members of a group leaves its ceiling", () => {
    expect(heldAfter([transfer(of("010"), of("020"), 300)])).toMatchObject({
      held: { G10: 6000, "010": 1700, "020": 1800 },
      unallocated: 2700,
      letter: "A",
    });
  });

  it("out of a group takes its ceiling along, and into a group raises it", () => {
    expect(heldAfter([transfer(of("010"), UNALLOCATED, 300)])).toMatchObject({
      held: { G10: 5700, "010": 1700 },
      unallocated: 3000,
    });
    expect(heldAfter([transfer(UNALLOCATED, of("020"), 300)])).toMatchObject({
      held: { G10: 6300, "020": 1800 },
      unallocated: 2400,
    });
  });

  it("from a group to its member moves nothing but the member", () => {
    const after = heldAfter([transfer(of("G10"), of("030"), 500)]);
    expect(after).toMatchObject({ held: { G10: 6000, "030": 500 }, unallocated: 2700, shortfall: null });
  });

  it("from a group takes only what its members don't hold", () => {
    expect(heldAfter([transfer(of("G10"), UNALLOCATED, 2500)]).shortfall).toBeNull();
    const { shortfall } = heldAfter([transfer(of("G10"), UNALLOCATED, 2501)]);
    expect(shortfall).toMatchObject({ giver: of("G10"), hundredths: 1 });
  });

  it("to a group without allocation opens its ceiling over what its members hold", () => {
    expect(heldAfter([transfer(UNALLOCATED, of("G20"), 100)])).toMatchObject({
      held: { G10: 6100, G20: 1600, "020": 1500 },
      unallocated: 2600,
      shortfall: null,
    });
  });

  it("from a saving promises more of it", () => {
    expect(heldAfter([transfer(of("050"), of("040"), 100)])).toMatchObject({
      held: { "050": -300, "040": 1100 },
      shortfall: null,
    });
  });

  it("to a saving beyond nothing is refused", () => {
    expect(heldAfter([transfer(of("040"), of("050"), 201)]).faults).toMatchObject([{ path: "transfers.0.receiver" }]);
  });

  it("that asks for too much names the giver and the newtons", () => {
    const { shortfall } = heldAfter([transfer(of("040"), of("010"), 1040)]);
    expect(shortfall).toMatchObject({ giver: of("040"), hundredths: 40 });
    expect(shortfall?.sentence.replace(/\s/g, " ")).toBe("Item 040 would have to give 0.40 N more than it holds.");
    expect(heldAfter([transfer(UNALLOCATED, of("010"), 2701)]).shortfall).toMatchObject({
      giver: UNALLOCATED,
      hundredths: 1,
    });
  });

  it("counts in the end only: what one takes another may give", () => {
    const transfers = [transfer(of("040"), of("010"), 1500), transfer(UNALLOCATED, of("040"), 600)];
    expect(heldAfter(transfers)).toMatchObject({ held: { "040": 100, "010": 3500, G10: 7500 }, shortfall: null });
  });

  it("without a known holder, to itself or of nothing is refused", () => {
    const transfers = [
      transfer(of("777"), of("010"), 10),
      transfer(of("010"), of("010"), 10),
      transfer(of("010"), of("020"), 0),
      transfer({ kind: "item", number: null }, of("020"), 5),
    ];
    const { faults, letter } = heldAfter(transfers);
    expect(faults.map(({ path }) => path)).toEqual([
      "transfers.0.giver",
      "transfers.1.receiver",
      "transfers.2.hundredths",
      "transfers.3.giver",
    ]);
    expect(letter).toBe("–");
  });
});

describe("acts that free or bind allocation", () => {
  it("retiring an item returns what it held to unallocated, in the same issue", () => {
    expect(heldAfter([], [retire("item", "010")])).toMatchObject({
      held: { G10: 4000, "020": 1500 },
      unallocated: 4700,
      letter: "A",
    });
    expect(heldAfter([], [retire("item", "010")]).held).not.toHaveProperty("010");
  });

  it("a limit or a reserve that moves moves unallocated", () => {
    expect(heldAfter([], [revise("operating_point", "OP-1", { limitHundredths: 9000 })])).toMatchObject({
      unallocated: 1700,
    });
    const lower = heldAfter([], [revise("operating_point", "OP-1", { limitHundredths: 7000 })]);
    expect(lower.shortfall).toMatchObject({ giver: UNALLOCATED, hundredths: 300 });
    const reserves = [{ operatingPoint: "OP-1", hundredths: 600 }];
    expect(heldAfter([], [revise("terms", "TM", { reserves })])).toMatchObject({ unallocated: 2600, letter: "A" });
  });

  it("another reference point brings its own limit and reserve", () => {
    expect(heldAfter([], [revise("terms", "TM", { referenceOperatingPoint: "OP-2" })])).toMatchObject({
      unallocated: 1100,
    });
  });

  it("an item moved out of its group counts by itself, with the ceiling left standing", () => {
    expect(heldAfter([], [revise("item", "010", { group: null })])).toMatchObject({
      held: { G10: 6000, "010": 2000 },
      unallocated: 700,
      letter: "A",
    });
  });

  it("an item moved into a group that has no room for it is refused", () => {
    const move = revise("item", "040", { group: "G10" });
    expect(heldAfter([], [move]).shortfall).toBeNull();
    const { shortfall } = heldAfter([transfer(of("G10"), UNALLOCATED, 2000)], [move]);
    expect(shortfall).toMatchObject({ giver: of("G10"), hundredths: 500 });
  });

  it("an added item has no allocation, and the sheet stays as it was", () => {
    const add: LineEdit = { operation: "add", kind: "item", number: "060", baseLetter: null, body: item("G10") };
    const after = heldAfter([], [add]);
    expect(after.held).not.toHaveProperty("060");
    expect(after.letter).toBe("–");
    expect(heldAfter([transfer(UNALLOCATED, of("060"), 100)], [add])).toMatchObject({
      held: { "060": 100, G10: 6100 },
    });
  });

  it("a retired group gives its ceiling back", () => {
    const edits = [
      revise("item", "010", { group: null }),
      revise("group", "G20", { parent: null }),
      retire("group", "G10"),
    ];
    expect(heldAfter([], edits)).toMatchObject({
      held: { "010": 2000, "020": 1500 },
      unallocated: 5200,
      shortfall: null,
    });
  });

  it("an edit that moves nothing of it leaves the sheet", () => {
    expect(heldAfter([], [revise("item", "040", { name: "renamed" })]).letter).toBe("–");
  });
});

describe("the view of allocations", () => {
  it("flags what is over, lists what has none without flagging it, and gives a group all it holds", () => {
    const tight = stateWith([row("item", "040", 479), row("item", "050", -160), row("group", "G10", 1440)], 7741);
    const view = allocationsView(tight, evaluateBudget(tight));
    const lines = Object.fromEntries(view.lines.map((line) => [line.number, line]));
    // Each item 4.00 N + 20 %: 4.80 N; the saving −2.00 + 0.40 N.
    expect(lines["040"]).toMatchObject({ allocationHundredths: 479, marginHundredths: -1, isOver: true });
    expect(lines["050"]).toMatchObject({ allocationHundredths: -160, marginHundredths: 0, isOver: false });
    expect(lines["010"]).toMatchObject({ allocationHundredths: null, marginHundredths: null, isOver: false });
    expect(lines["G10"]).toMatchObject({ marginHundredths: 0, isOver: false, freeHundredths: 1440 });
    expect(view).toMatchObject({ allocatedHundredths: 1759, unallocatedHundredths: 7741, isConserved: true });
  });

  it("says so where the stored rest doesn't add up", () => {
    const wrong = stateWith([row("item", "040", 479)], 9000);
    expect(allocationsView(wrong, evaluateBudget(wrong)).isConserved).toBe(false);
  });
});

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
