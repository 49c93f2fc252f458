import { describe, expect, it } from "vitest";
import { applyEdits } from "@/lib/evaluation/budget/apply-edits";
import type { LineEdit } from "@/lib/evaluation/budget/edits";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { add, bodyOf, FIXED, PLATE, retire, revise, STATE } from "./edit-fixture";

describe("edits that are refused, each at its field", () => {
  it.each<[string, LineEdit[], string, string]>([
    [
      "a number that is in use",
      [add("item", "010", PLATE)],
      "edits.0.number",
      "010 is taken: a number is never used again, not even a retired one.",
    ],
    [
      "a number that is none",
      [add("item", "a b", PLATE)],
      "edits.0.number",
      "Capital letters, digits and hyphens, at most 12, for example 010.",
    ],
    [
      "a line that isn't there",
      [{ ...retire("item", "010"), number: "777" }],
      "edits.0.number",
      "There is no item 777.",
    ],
    [
      "reinstating what is in force",
      [{ ...retire("item", "010"), operation: "reinstate" }],
      "edits.0.operation",
      "010 is in force already.",
    ],
    [
      "two edits of one line",
      [revise("item", "010", { faces: 1 }), retire("item", "010")],
      "edits.1.number",
      "010 is edited twice here.",
    ],
    [
      "a fault of typing",
      [revise("item", "010", { length: { value: -1 } })],
      "edits.0.body.length",
      "Must be greater than 0.",
    ],
    [
      "a body that is missing",
      [{ ...revise("item", "010", {}), body: null }],
      "edits.0.body",
      "Fill in the fields of this line.",
    ],
    [
      "retiring a share's member",
      [retire("item", "010")],
      "edits.0.operation",
      "Can't be retired: item 020 lies behind it.",
    ],
    [
      "retiring what only a share names",
      [revise("item", "020", { liesBehind: null, runUpFollows: false }), retire("item", "010")],
      "edits.1.operation",
      "Can't be retired: share 090 names it.",
    ],
    [
      "retiring a group that holds items",
      [retire("group", "G10")],
      "edits.0.operation",
      "Can't be retired: group G20 belongs to it.",
    ],
    ["retiring a finish in use", [retire("finish", "F10")], "edits.0.operation", "Can't be retired: item 010 has it."],
    [
      "retiring the reference point",
      [retire("operating_point", "OP-1")],
      "edits.0.operation",
      "The reference operating point can't be retired.",
    ],
    [
      "retiring the terms",
      [retire("terms", "TM")],
      "edits.0.operation",
      "A product has one terms line: it can only be revised.",
    ],
    [
      "typing into the allocations sheet",
      [revise("allocations", "AL", { unallocatedHundredths: 1 })],
      "edits.0.operation",
      "The allocations sheet changes by transfers alone: name giver and receiver.",
    ],
    [
      "a group that isn't there",
      [revise("item", "010", { group: "G99" })],
      "edits.0.body.group",
      "Group G99 does not exist or is retired.",
    ],
    [
      "a finish that isn't there",
      [revise("item", "010", { finish: "F99" })],
      "edits.0.body.finish",
      "Finish F99 does not exist or is retired.",
    ],
    [
      "a share of what isn't there",
      [revise("item", "090", { of: ["777"] })],
      "edits.0.body.of",
      "Item 777 does not exist or is retired.",
    ],
    [
      "a share of a saving that it doesn't count",
      [add("item", "040", { ...FIXED, saving: true, force: { value: -1 } }), revise("item", "090", { of: ["040"] })],
      "edits.1.body.of",
      "Item 040 is a saving: say that savings count along, or leave it out.",
    ],
    [
      "lying behind what is no plate",
      [revise("item", "020", { liesBehind: "030" })],
      "edits.0.body.liesBehind",
      "Item 030 is no flat plate: type the run-up.",
    ],
    [
      "a circle of plates",
      [revise("item", "010", { liesBehind: "020", runUpFollows: true })],
      "edits.0.body.liesBehind",
      "Plates would lie behind one another in a circle: 010 → 020 → 010.",
    ],
    [
      "a circle of groups",
      [revise("group", "G10", { parent: "G20" })],
      "edits.0.body.parent",
      "Groups would hold one another in a circle: G10 → G20 → G10.",
    ],
    [
      "a share in the group it names",
      [revise("item", "090", { of: [], ofGroup: "G10", group: "G20" })],
      "edits.0.body.ofGroup",
      "A share would depend on itself: 090 → 090.",
    ],
    [
      "taking the limit from the reference point",
      [revise("operating_point", "OP-1", { limitHundredths: null })],
      "edits.0.body.limitHundredths",
      "The reference operating point needs a limit of its own.",
    ],
    [
      "a reference point without a limit of its own",
      [
        revise("terms", "TM", {
          referenceOperatingPoint: "OP-2",
          reserves: [{ operatingPoint: "OP-2", hundredths: 0 }],
        }),
      ],
      "edits.0.body.referenceOperatingPoint",
      "OP-2 has no limit of its own.",
    ],
    [
      "a method's version that nobody knows",
      [revise("item", "010", { methodVersion: 3 })],
      "edits.0.body.methodVersion",
      "No method of this version is known.",
    ],
    [
      "a smooth finish under a fully rough line",
      [revise("item", "010", { frictionLine: "fully-rough" }), revise("finish", "F10", { roughness: { value: 0 } })],
      "edits.0.body.finish",
      "A fully rough line needs a finish with a roughness greater than 0.",
    ],
  ])("%s", (_, edits, path, sentence) => {
    const { faults } = applyEdits(STATE, edits, []);
    expect(faults).toContainEqual({ path, sentence });
    expect(faults.filter((fault) => fault.path !== path)).toEqual([]);
  });

  it("an owner who may not own", () => {
    const { faults } = applyEdits(STATE, [revise("item", "010", { ownerId: 9 })], [], { mayOwn: (id) => id === 1 });
    expect(faults).toEqual([
      { path: "edits.0.body.ownerId", sentence: "Choose a member of this product who may own items." },
    ]);
  });

  it("are left out of the state, and so is what leans on them", () => {
    const { state, faults } = applyEdits(
      STATE,
      [
        add("group", "G30", { name: "" }),
        add("item", "040", { ...FIXED, group: "G30" }),
        revise("item", "030", { force: { value: 5 } }),
      ],
      [],
    );
    expect(faults.map(({ path }) => path)).toEqual(expect.arrayContaining(["edits.0.body.name", "edits.1.body.group"]));
    expect(state.lines.some(({ number }) => number === "G30" || number === "040")).toBe(false);
    expect(bodyOf(state, "item", "030")).toMatchObject({ force: { value: 5 } });
  });

  it("a number of a retired line is not free either", () => {
    const { state } = applyEdits(STATE, [retire("item", "030")], []);
    expect(applyEdits(state, [add("item", "030", FIXED)], []).faults).toMatchObject([{ path: "edits.0.number" }]);
  });

  it("a duct without its flow area", () => {
    const duct: BudgetState = { ...STATE, product: { ...STATE.product, kind: "duct" } };
    const edit = revise("terms", "TM", { evidenceAgeDays: 10 });
    expect(applyEdits(duct, [edit], []).faults).toMatchObject([{ path: "edits.0.body.flowArea" }]);
  });
});
