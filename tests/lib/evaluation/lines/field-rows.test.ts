import { describe, expect, it } from "vitest";
import { canonicalLineText } from "@/lib/evaluation/lines/canonical-line-text";
import { fieldRows } from "@/lib/evaluation/lines/field-rows";
import { nameBookOf } from "@/lib/evaluation/lines/name-book";
import { newTerms } from "@/lib/evaluation/lines/terms-body";
import { budgetState, line } from "@/tests/support/budget-state";

const AIR = {
  fluid: "air",
  staticTemperature: { value: 288.15, entered: "15 °C" },
  staticPressure: { value: 101325 },
  speed: { value: 25, entered: "90 km/h" },
};
const PANEL = {
  name: "Front panels",
  ownerId: 3,
  order: 10,
  grade: "preliminary",
  methodVersion: 1,
  method: "flat-plate-friction",
  length: { value: 8.2296, entered: "27 ft", standardUncertainty: 0.005 },
  breadth: { value: 0.95, entered: "0.95 m" },
  faces: 2,
  finish: "F10",
  evidence: [{ document: "Drawing 7731", revision: "C", date: "2026-03-02" }],
};
const STATE = budgetState({
  code: "TF-2",
  name: "Side fairing",
  kind: "vehicle_fairing",
  point: AIR,
  limitHundredths: 6600,
  reserveHundredths: 300,
  finishes: { F10: { name: "gloss paint", roughness: { value: 6e-6 }, source: "judgement" } },
  items: { "010": PANEL },
});
const NAMES = nameBookOf(STATE, new Map([[3, "Tansy Ardle"]]));

const JUSTIFIED = "justifications.mach-above-limit";

function rowOf(kind: "item" | "terms" | "operating_point" | "allocations", body: object, field: string) {
  return fieldRows({ kind, body }, NAMES).find((row) => row.field === field);
}

describe("the fields of a line as they are printed", () => {
  const { body } = line("item", "010", PANEL);

  it("show values in the engineer's unit, with the typed text where it says something else", () => {
    expect(rowOf("item", body, "length")).toEqual({
      field: "length",
      label: "Length along the flow",
      text: "8.2296 ± 0.005",
      unit: "m",
      us: "27\u2009ft",
      entered: "27 ft",
    });
    // 0.95 / 0.3048, the foot of NIST SP 811.
    const breadth = { field: "breadth", label: "Breadth", text: "0.95", unit: "m", us: "3.117\u2009ft" };
    expect(rowOf("item", body, "breadth")).toEqual(breadth);
  });

  it("name persons, finishes, choices and citations", () => {
    expect(rowOf("item", body, "ownerId")?.text).toBe("Tansy Ardle");
    expect(rowOf("item", body, "finish")?.text).toBe("F10 gloss paint");
    expect(rowOf("item", body, "method")?.text).toBe("Flat-plate friction");
    expect(rowOf("item", body, "evidence.0")).toMatchObject({
      label: "Citation 1",
      text: "Drawing 7731, C, 2026-03-02",
    });
  });

  it("go on after a typed sentence with a sentence", () => {
    const justified = (text: string) =>
      rowOf("item", { ...body, justifications: [{ code: "mach-above-limit", text, excess: 1.1 }] }, JUSTIFIED)?.text;
    expect(justified("Measured so.")).toBe("Measured so. Justified up to 1.1");
    expect(justified("measured so")).toBe("measured so, justified up to 1.1");
  });

  it("leave out what doesn't matter beside the rest", () => {
    expect(rowOf("item", body, "roughness")).toBeUndefined();
    expect(rowOf("item", body, "trippedAt")).toBeUndefined();
    expect(rowOf("item", { ...body, transition: "tripped" }, "trippedAt")?.text).toBe("0");
    expect(rowOf("item", { ...body, transition: "tripped" }, "criticalReynolds")).toBeUndefined();
  });

  it("tell records and lists field by field", () => {
    const terms = newTerms({ referenceOperatingPoint: "OP-1", reserveHundredths: 300 });
    expect(rowOf("terms", terms, "growthTable.released")).toEqual({
      field: "growthTable.released",
      label: "Growth allowance: released",
      text: "5",
      unit: "%",
    });
    expect(rowOf("terms", terms, "reserves.OP-1")).toMatchObject({ label: "Reserve at OP-1", text: "3.00", unit: "N" });
    expect(rowOf("terms", terms, "reviewRules.programManagerOn.gradeSteps")?.text).toBe("2");
    const sheet = { rows: [{ kind: "item", number: "010", hundredths: 700 }], unallocatedHundredths: 5600 };
    expect(rowOf("allocations", sheet, "rows.item-010")).toMatchObject({ text: "7.00", unit: "N" });
  });

  it("print an unfinished draft too", () => {
    expect(rowOf("item", { method: "fixed", force: null, name: "" }, "force")).toMatchObject({ text: "none" });
    expect(rowOf("item", { method: "fixed", force: "three" }, "force")).toMatchObject({ text: "three" });
    expect(() => fieldRows({ kind: "item", body: {} }, NAMES)).not.toThrow();
  });
});

describe("the canonical text of a line", () => {
  const item = line("item", "010", PANEL);

  it("has one row a field, in SI, with every digit and what was typed", () => {
    const rows = canonicalLineText(item, NAMES).split("\n");
    expect(rows.slice(0, 2)).toEqual(["line: item 010", "retired: no"]);
    expect(rows).toContain('length: 8.2296 m, standard uncertainty 0.005 m, typed "27 ft"');
    expect(rows).toContain("ownerId: 3 (Tansy Ardle)");
    expect(rows).toContain("finish: F10 (gloss paint)");
    expect(rows).toContain("trippedAt: 0 m");
    expect(rows).toContain("evidence.1.document: Drawing 7731");
    expect(rows).toContain("basis: ");
  });

  it("differs wherever a body differs", () => {
    const changes = [
      { length: { value: 8.229600000000001 } },
      { transition: "tripped" },
      { trippedAt: { value: 0.1 } },
      { ownerId: 4 },
      { evidence: [] },
      { justifications: [{ code: "mach-above-limit", text: "measured", excess: 1.1 }] },
    ];
    const texts = changes.map((change) => canonicalLineText(line("item", "010", { ...PANEL, ...change }), NAMES));
    expect(new Set([canonicalLineText(item, NAMES), ...texts]).size).toBe(changes.length + 1);
  });

  it("lets no text pass itself off as a row", () => {
    const forged = line("item", "010", { ...PANEL, basis: "ok\nfaces: 1" });
    const rows = canonicalLineText(forged, NAMES).split("\n");
    expect(rows.filter((row) => row.startsWith("faces:"))).toEqual(["faces: 2"]);
    expect(rows).toContain("basis: ok\\nfaces: 1");
  });
});
