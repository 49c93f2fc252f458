import { describe, expect, it } from "vitest";
import { allocationsView } from "@/lib/evaluation/budget/allocations-view";
import type { LineEdit } from "@/lib/evaluation/budget/edits";
import { applyEdits } from "@/lib/evaluation/budget/apply-edits";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import {
  ALLOCATED,
  heldAfter,
  item,
  of,
  retire,
  revise,
  row,
  stateWith,
  transfer,
  UNALLOCATED,
} from "./allocation-fixture";

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

  it("what this change retires may still give, what was retired before holds nothing to give", () => {
    const gives = [transfer(of("040"), UNALLOCATED, 100)];
    expect(applyEdits(ALLOCATED, [retire("item", "040")], gives).faults).toEqual([]);
    const { state } = applyEdits(ALLOCATED, [retire("item", "040")], []);
    expect(applyEdits(state, [], gives).faults).toEqual([
      { path: "transfers.0.giver", sentence: "The item 040 is retired." },
    ]);
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
