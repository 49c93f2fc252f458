import { describe, expect, it } from "vitest";
import type { LineEdit } from "@/lib/evaluation/budget/edits";
import type { BudgetState, LineState } from "@/lib/evaluation/lines/line-state";
import { parseBody } from "@/lib/evaluation/lines/parse-body";
import { newTerms } from "@/lib/evaluation/lines/terms-body";
import { overtakenReasons } from "@/lib/proposals/review/overtaken";
import type { LineKind } from "@/lib/vocabulary/lines";

function line(kind: LineKind, number: string, body: Record<string, unknown>, letter = "–", issue = 1): LineState {
  const parsed = parseBody(kind, body);
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.faults));
  return { number, letter, issue, retired: false, ...parsed.content };
}

const common = {
  ownerId: 1,
  order: 10,
  group: null,
  grade: "estimated",
  saving: false,
  methodVersion: 1,
  evidence: [],
  justifications: [],
  basis: "",
} as const;

function plate(number: string, change: Record<string, unknown> = {}): LineState {
  return line("item", number, {
    ...common,
    name: `Plate ${number}`,
    method: "flat-plate-friction",
    length: { value: 3 },
    breadth: { value: 1 },
    faces: 2,
    finish: "F10",
    frictionLine: "automatic",
    transition: "natural",
    ...change,
  });
}

function area(number: string, group: string | null = null, saving = false): LineState {
  const dragArea = { value: saving ? -0.01 : 0.01 };
  return line("item", number, {
    ...common,
    name: number,
    method: "drag-area",
    dragArea,
    source: "test",
    group,
    saving,
  });
}

function share(change: Record<string, unknown>): LineState {
  const fields = { name: "Gaps", method: "share", fraction: 0.05, source: "test", includeSavings: false };
  return line("item", "900", { ...common, ...fields, ...change });
}

const group = (number: string, parent: string | null) => line("group", number, { name: number, parent, order: 1 });
const finish = (number: string) =>
  line("finish", number, { name: "Gloss paint", roughness: { value: 6e-6 }, source: "test" });
const point = line("operating_point", "OP-1", {
  name: "Motorway",
  fluid: "air",
  staticTemperature: { value: 288.15, entered: "15 °C" },
  staticPressure: { value: 101325 },
  speed: { value: 25, entered: "90 km/h" },
  limitHundredths: 6600,
});
const terms = line("terms", "TM", newTerms({ referenceOperatingPoint: "OP-1", reserveHundredths: 300 }));

const LINES = [
  terms,
  point,
  finish("F10"),
  finish("F20"),
  group("G10", null),
  group("G20", "G10"),
  plate("010"),
  plate("020", { liesBehind: "010", runUpFollows: true }),
  area("030", "G20"),
  area("040", "G20", true),
  area("050"),
];

function state(lines: readonly LineState[]): BudgetState {
  return { product: { code: "TF-2", name: "Side fairing", kind: "vehicle_fairing" }, lines };
}

/** The base with one line revised, in issue 3. */
function withRevised(number: string, kind: LineKind, change: Record<string, unknown> = {}): BudgetState {
  return state(
    LINES.map((each) =>
      each.number === number && each.kind === kind ? line(kind, number, { ...each.body, ...change }, "A", 3) : each,
    ),
  );
}

function edit({ kind, number, body }: LineState): LineEdit {
  return { operation: "revise", kind, number, baseLetter: "–", body };
}

const base = state(LINES);
const edit020 = [edit(plate("020", { liesBehind: "010", runUpFollows: true, length: { value: 3.6 } }))];

describe("a proposal that other approvals overtake", () => {
  it("is not overtaken while nothing changed", () => {
    expect(overtakenReasons(base, base, edit020)).toEqual([]);
  });

  it("is overtaken by a new revision of a line it edits", () => {
    expect(overtakenReasons(base, withRevised("020", "item"), edit020)).toEqual([
      "Item 020 has a new revision, A, since issue 3.",
    ]);
  });

  it.each([
    ["fluid", { fluid: "fresh-water", staticPressure: null }],
    ["temperature", { staticTemperature: { value: 258.15 } }],
    ["humidity", { relativeHumidity: 0.5 }],
    ["speed", { speed: { value: 30 } }],
  ])("is overtaken by another %s of any operating point", (_, change) => {
    expect(overtakenReasons(base, withRevised("OP-1", "operating_point", change), edit020)).toEqual([
      "Operating point OP-1 has another fluid, state or speed since issue 3.",
    ]);
  });

  it.each([
    ["limit", { limitHundredths: 7000 }],
    ["name", { name: "Motorway, dry" }],
    ["hours a year", { hoursPerYear: 2000 }],
    ["speed typed in another unit", { speed: { value: 25, entered: "25 m/s" } }],
  ])("is not overtaken by another %s of an operating point", (_, change) => {
    expect(overtakenReasons(base, withRevised("OP-1", "operating_point", change), edit020)).toEqual([]);
  });

  it("is overtaken by another growth table, but by nothing else of the terms", () => {
    const growthTable = {
      ...newTerms({ referenceOperatingPoint: "OP-1", reserveHundredths: 0 }).growthTable,
      layout: 0.2,
    };
    expect(overtakenReasons(base, withRevised("TM", "terms", { growthTable }), edit020)).toEqual([
      "The growth table changed in issue 3.",
    ]);
    expect(overtakenReasons(base, withRevised("TM", "terms", { evidenceAgeDays: 99 }), edit020)).toEqual([]);
  });

  it("is overtaken by the finish that its item uses and the item it lies behind, by no other", () => {
    expect(overtakenReasons(base, withRevised("F10", "finish"), edit020)).toHaveLength(1);
    expect(overtakenReasons(base, withRevised("F20", "finish"), edit020)).toEqual([]);
    expect(overtakenReasons(base, withRevised("010", "item"), edit020)).toEqual([
      "Item 010 has a new revision, A, since issue 3.",
    ]);
    expect(overtakenReasons(base, withRevised("050", "item"), edit020)).toEqual([]);
  });

  it("is overtaken by a member of the share it edits, in a subgroup too, a saving only if asked for", () => {
    const named = [edit(share({ of: ["050"] }))];
    expect(overtakenReasons(base, withRevised("050", "item"), named)).toHaveLength(1);
    expect(overtakenReasons(base, withRevised("030", "item"), named)).toEqual([]);
    const ofGroup = [edit(share({ ofGroup: "G10" }))];
    expect(overtakenReasons(base, withRevised("030", "item"), ofGroup)).toHaveLength(1);
    expect(overtakenReasons(base, withRevised("040", "item"), ofGroup)).toEqual([]);
    const withSavings = [edit(share({ ofGroup: "G10", includeSavings: true }))];
    expect(overtakenReasons(base, withRevised("040", "item"), withSavings)).toHaveLength(1);
  });

  it("is overtaken when an item joins or leaves the group of the share it edits", () => {
    const ofGroup = [edit(share({ ofGroup: "G10" }))];
    expect(overtakenReasons(base, withRevised("030", "item", { group: null }), ofGroup)).toEqual([
      "Item 030 left group G10, of which an edited item is a share.",
    ]);
    expect(overtakenReasons(base, withRevised("050", "item", { group: "G20" }), ofGroup)).toContain(
      "Item 050 joined group G10, of which an edited item is a share.",
    );
  });

  it("is not overtaken through what an item used only before a retirement", () => {
    const retire: LineEdit = { operation: "retire", kind: "item", number: "020", baseLetter: "–", body: null };
    expect(overtakenReasons(base, withRevised("F10", "finish"), [retire])).toEqual([]);
  });
});
