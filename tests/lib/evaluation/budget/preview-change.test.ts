import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { applyEdits } from "@/lib/evaluation/budget/apply-edits";
import type { LineEdit } from "@/lib/evaluation/budget/edits";
import { effectsOf } from "@/lib/evaluation/budget/effects-of";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { fieldEffects } from "@/lib/evaluation/budget/field-effects";
import { previewChange } from "@/lib/evaluation/budget/preview-change";
import type { BudgetResults } from "@/lib/evaluation/budget/results";
import type { LineKind } from "@/lib/vocabulary/lines";
import { budgetState } from "@/tests/support/budget-state";
import { sideFairing } from "@/tests/support/demo-budgets";

const AIR = {
  name: "Cruise",
  fluid: "air",
  staticTemperature: { value: 288.15 },
  staticPressure: { value: 101325 },
  speed: { value: 25 },
};
const COMMON = { ownerId: 1, grade: "estimated", methodVersion: 1 };
const PLATE = {
  ...COMMON,
  name: "plate",
  order: 10,
  method: "flat-plate-friction",
  length: { value: 2.4 },
  breadth: { value: 0.95 },
  faces: 2,
  finish: "F10",
};
const BODY = {
  ...COMMON,
  name: "body",
  order: 30,
  method: "bluff-body",
  dragCoefficient: 0.3,
  referenceArea: { value: 0.06 },
  source: "judgement",
};
const SHARE = { ...COMMON, name: "share", order: 90, method: "share", fraction: 0.1, source: "judgement" };
const LOSS = {
  ...COMMON,
  name: "loss",
  order: 50,
  method: "loss-coefficient",
  lossCoefficient: 0.2,
  source: "judgement",
};

const STATE = budgetState({
  code: "T-1",
  name: "Test",
  kind: "duct",
  point: AIR,
  otherPoints: { "OP-2": { ...AIR, name: "Slow", speed: { value: 12 } } },
  limitHundredths: 10000,
  reserveHundredths: 500,
  terms: { flowArea: { value: 0.02 } },
  groups: { G10: { name: "Cab", order: 10 }, G20: { name: "Roof", parent: "G10", order: 20 } },
  finishes: {
    F10: { name: "paint", roughness: { value: 6e-6 }, source: "judgement" },
    F20: { name: "galvanised", roughness: { value: 1.5e-4 }, source: "judgement" },
  },
  items: {
    "010": PLATE,
    "020": { ...PLATE, order: 20, length: { value: 3.6 }, liesBehind: "010", runUpFollows: true, group: "G20" },
    "025": { ...PLATE, order: 25, length: { value: 1 }, liesBehind: "020", runUpFollows: true, finish: "F20" },
    "030": { ...BODY, group: "G10" },
    "040": { ...BODY, order: 40, grade: "layout", evidence: [{ document: "x", revision: "1", date: "2026-01-01" }] },
    "050": LOSS,
    "080": { ...SHARE, of: ["010", "040"] },
    "090": { ...SHARE, ofGroup: "G10" },
    "095": { ...SHARE, of: ["090"] },
  },
});
const FROZEN = evaluateBudget(STATE);

function edit(operation: LineEdit["operation"], kind: LineKind, number: string, change: object = {}): LineEdit {
  const line = STATE.lines.find((each) => each.kind === kind && each.number === number);
  const body = operation === "retire" ? null : { ...line?.body, ...change };
  return { operation, kind, number, baseLetter: line?.letter ?? null, body };
}

const revise = (kind: LineKind, number: string, change: object) => edit("revise", kind, number, change);

const TABLE = {
  estimated: 0.25,
  layout: 0.15,
  preliminary: 0.1,
  released: 0.05,
  measured_like_part: 0.03,
  measured_actual: 0,
};
const EDITS: LineEdit[] = [
  revise("item", "010", { length: { value: 2.1 } }),
  revise("item", "020", { group: null }),
  revise("item", "030", { dragCoefficient: 0.5 }),
  revise("item", "040", { group: "G20", name: "moved" }),
  revise("item", "080", { of: ["010"] }),
  revise("finish", "F20", { roughness: { value: 3e-4 } }),
  revise("finish", "F10", { name: "renamed" }),
  revise("operating_point", "OP-2", { speed: { value: 14 } }),
  revise("operating_point", "OP-1", { limitHundredths: 9000 }),
  revise("terms", "TM", { growthTable: TABLE, flowArea: { value: 0.03 } }),
  revise("group", "G20", { parent: null }),
  edit("retire", "item", "095"),
  edit("retire", "operating_point", "OP-2"),
  { ...edit("add", "item", "060"), body: { ...BODY, order: 60, group: "G20" } },
  { ...edit("add", "item", "070"), body: { ...PLATE, order: 70 } },
  { ...edit("add", "operating_point", "OP-3"), body: { ...AIR, name: "Cold", staticTemperature: { value: 258.15 } } },
];
const oneEditALine = fc
  .subarray(EDITS)
  .map((edits) => edits.filter((each, index) => edits.findIndex(({ number }) => number === each.number) === index));

describe("a preview", () => {
  it("gives what a whole evaluation gives, for any edits", () => {
    fc.assert(
      fc.property(oneEditALine, (edits) => {
        const { after, faults } = previewChange(STATE, FROZEN, edits, []);
        expect(faults).toEqual([]);
        expect(after.results).toEqual(evaluateBudget(applyEdits(STATE, edits, []).state));
      }),
      { numRuns: 200 },
    );
  });

  it.each(EDITS.map((each) => ({ name: `${each.operation} ${each.kind} ${each.number}`, each })))(
    "gives what a whole evaluation gives for the edit alone: $name",
    ({ each }) => {
      const { after } = previewChange(STATE, FROZEN, [each], []);
      expect(after.results).toEqual(evaluateBudget(applyEdits(STATE, [each], []).state));
    },
  );

  it("never computes anew what depends on nothing that moved", () => {
    const marked = withBasics(FROZEN, 123);
    const { after } = previewChange(STATE, marked, [revise("finish", "F20", { roughness: { value: 3e-4 } })], []);
    const kept = after.results.points[0]?.items.filter(({ basic }) => basic === 123).map(({ item }) => item);
    const all = FROZEN.points[0]?.items.map(({ item }) => item);
    expect(kept).toEqual(all?.filter((item) => item !== "025"));
    expect(kept).toHaveLength(8);
  });

  it("tells followers apart from what was edited", () => {
    const { effects } = previewChange(STATE, FROZEN, [revise("item", "010", { length: { value: 2.1 } })], []);
    const atFirst = effects.items.filter(({ operatingPoint }) => operatingPoint === "OP-1");
    expect(atFirst.filter(({ edited }) => edited).map(({ item }) => item)).toEqual(["010"]);
    // 020 and 025 lie behind it; 080 names it; 090 holds 020 through its group and 095 is a share of 090.
    const followers = effects.followers
      .filter(({ operatingPoint }) => operatingPoint === "OP-1")
      .map(({ item }) => item);
    expect(followers.sort()).toEqual(["020", "025", "080", "090", "095"]);
  });

  it("still shows the sound edits beside one with a fault", () => {
    const { effects, faults } = previewChange(
      STATE,
      FROZEN,
      [revise("item", "010", { faces: 0 }), revise("item", "030", { dragCoefficient: 0.6 })],
      [],
    );
    expect(faults).toMatchObject([{ path: "edits.0.body.faces" }]);
    expect(effects.items.find(({ item }) => item === "030")?.basicDelta).toBeGreaterThan(0);
  });
});

function withBasics(results: BudgetResults, basic: number): BudgetResults {
  return {
    ...results,
    points: results.points.map((point) => ({ ...point, items: point.items.map((item) => ({ ...item, basic })) })),
  };
}

describe("the effects of a change", () => {
  it("are those of the demo table: brackets from 22 to 18 take 6.25 to 5.12 N basic", () => {
    const after = sideFairing();
    const brackets = after.lines.find(({ number }) => number === "100");
    const was: LineEdit = {
      operation: "revise",
      kind: "item",
      number: "100",
      baseLetter: "–",
      body: { ...brackets?.body, referenceArea: { value: 0.033 } },
    };
    const before = applyEdits(after, [was], []).state;
    const { effects } = previewChange(before, evaluateBudget(before), [{ ...was, body: brackets?.body ?? null }], []);
    const [effect] = effects.items;
    expect(effect).toMatchObject({ item: "100", edited: true });
    expect(effect?.basicWas).toBeCloseTo(6.25, 2);
    expect(effect?.basicNow).toBeCloseTo(5.12, 2);
    expect(effects.points[0]?.predictedDelta).toBeCloseTo(-1.13 * 1.1, 1);
    expect(effects.followers).toEqual([]);
  });

  it("tell limits, standings, new notes and vanished ones", () => {
    const fast = revise("operating_point", "OP-1", { speed: { value: 120 }, limitHundredths: 100 });
    const { effects, after } = previewChange(STATE, FROZEN, [fast], []);
    const point = effects.points.find(({ operatingPoint }) => operatingPoint === "OP-1");
    expect([point?.was?.standing, point?.now?.standing]).toEqual(["inside", "over"]);
    expect(point?.now?.limitHundredths).toBe(100);
    const first = effects.items.find(({ item, operatingPoint }) => item === "030" && operatingPoint === "OP-1");
    expect(first?.newNotes.map(({ code }) => code)).toEqual(["mach-above-limit"]);

    const back = effectsOf(after.results, FROZEN);
    const undone = back.items.find(({ item, operatingPoint }) => item === "030" && operatingPoint === "OP-1");
    expect(undone?.vanishedNotes.map(({ code }) => code)).toEqual(["mach-above-limit"]);
  });

  it("count an added item from nothing and a retired one to nothing", () => {
    const added = previewChange(STATE, FROZEN, EDITS.slice(13, 14), []).effects.items.find(
      ({ item }) => item === "060",
    );
    expect(added).toMatchObject({ predictedWas: null, edited: true });
    expect(added?.predictedDelta).toBe(added?.predictedNow);
    const gone = previewChange(STATE, FROZEN, [edit("retire", "item", "095")], []).effects.items[0];
    expect(gone).toMatchObject({ item: "095", predictedNow: null });
    expect(gone?.predictedDelta).toBe(-(gone?.predictedWas ?? NaN));
  });

  it("list every item at an operating point that is new, without a change of any total", () => {
    const { effects } = previewChange(STATE, FROZEN, EDITS.slice(15), []);
    const there = effects.items.filter(({ operatingPoint }) => operatingPoint === "OP-3");
    expect(there).toHaveLength(9);
    expect(effects.points.find(({ operatingPoint }) => operatingPoint === "OP-3")).toMatchObject({
      was: null,
      predictedDelta: 0,
    });
  });
});

describe("the effects of single fields", () => {
  it("are applied in the order shown and sum to the line's", () => {
    const change = revise("item", "030", {
      dragCoefficient: 0.5,
      referenceArea: { value: 0.05 },
      grade: "layout",
      name: "x",
    });
    const { fields, predictedDelta } = fieldEffects(STATE, FROZEN, change, "OP-1");
    expect(fields.map(({ field }) => field)).toEqual(["name", "grade", "dragCoefficient", "referenceArea"]);
    // q·C_D·A with ρ 1.225 kg/m³ at 25 m/s: 382.8 Pa.
    const q = 0.5 * 1.225 * 25 ** 2;
    expect(fields[0]?.predictedDelta).toBe(0);
    expect(fields[1]?.predictedDelta).toBeCloseTo(q * 0.3 * 0.06 * (1.15 - 1.2), 3);
    expect(fields[2]?.predictedDelta).toBeCloseTo(q * 0.06 * 1.15 * (0.5 - 0.3), 3);
    expect(fields[3]?.predictedDelta).toBeCloseTo(q * 0.5 * 1.15 * (0.05 - 0.06), 3);
    const sum = fields.reduce((total, field) => total + (field.predictedDelta ?? 0), 0);
    expect(sum).toBeCloseTo(predictedDelta ?? NaN, 9);
  });

  it("stand together where one makes no sense without the next", () => {
    const change = revise("item", "010", { finish: null, roughness: { value: 2e-4 } });
    const { fields, predictedDelta } = fieldEffects(STATE, FROZEN, change, "OP-1");
    expect(fields).toMatchObject([
      { field: "finish", predictedDelta: null },
      { field: "roughness", predictedDelta },
    ]);
    expect(predictedDelta).not.toBeNull();
  });

  it("count the fields of another method at the method", () => {
    const { dragCoefficient: _, referenceArea: __, ...rest } = BODY;
    const body = { ...rest, group: "G10", method: "drag-area", dragArea: { value: 0.02 }, name: "renamed" };
    const { fields, predictedDelta } = fieldEffects(STATE, FROZEN, { ...edit("revise", "item", "030"), body }, "OP-1");
    expect(fields.map(({ field }) => field)).toEqual(["method", "name"]);
    expect(fields[0]?.predictedDelta).toBe(predictedDelta);
  });

  it("of the growth table are told grade by grade, on the total", () => {
    const change = revise("terms", "TM", { growthTable: { ...TABLE, layout: 0.3 } });
    const { fields, predictedDelta } = fieldEffects(STATE, FROZEN, change, "OP-1");
    expect(fields.map(({ field }) => field)).toEqual(["growthTable.estimated", "growthTable.layout"]);
    const { after } = previewChange(STATE, FROZEN, [change], []);
    const totals = [FROZEN.points[0]?.totals.predicted ?? NaN, after.results.points[0]?.totals.predicted ?? NaN];
    expect(predictedDelta).toBeCloseTo(totals[1]! - totals[0]!, 9);
  });

  it("of a line that comes or goes are the line's alone", () => {
    expect(fieldEffects(STATE, FROZEN, edit("retire", "item", "095"), "OP-1").predictedDelta).toBeLessThan(0);
    const added = fieldEffects(STATE, FROZEN, EDITS[13] ?? edit("retire", "item", "095"), "OP-1");
    expect(added).toMatchObject({ fields: [] });
    expect(added.predictedDelta).toBeGreaterThan(0);
  });
});
