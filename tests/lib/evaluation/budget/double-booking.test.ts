import { describe, expect, it } from "vitest";
import type { LineEdit } from "@/lib/evaluation/budget/edits";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { itemsBehind } from "@/lib/evaluation/budget/items-behind";
import { indexState } from "@/lib/evaluation/budget/indexed-state";
import { previewChange } from "@/lib/evaluation/budget/preview-change";
import { noteSentence } from "@/lib/evaluation/notes/note-catalogue";
import { budgetState } from "@/tests/support/budget-state";

const AIR = {
  fluid: "air",
  staticTemperature: { value: 288.15 },
  staticPressure: { value: 101325 },
  speed: { value: 25 },
};

function plate(length: number, more: object = {}) {
  return {
    ...{ ownerId: 1, grade: "estimated", methodVersion: 1, name: "plate", order: 10, method: "flat-plate-friction" },
    ...{ length: { value: length }, breadth: { value: 0.95 }, faces: 2, roughness: { value: 0 } },
    ...{ transition: "tripped", frictionLine: "prandtl-schlichting" },
    ...more,
  };
}

function bluff(more: object = {}) {
  const common = { ownerId: 1, grade: "estimated", methodVersion: 1, name: "lamp", order: 20, source: "judgement" };
  return { ...common, method: "bluff-body", dragCoefficient: 1, referenceArea: { value: 0.1 }, ...more };
}

const stateOf = (items: Record<string, object>) =>
  budgetState({
    ...{ code: "T-1", name: "Test", kind: "vehicle_fairing", point: AIR, items },
    ...{ limitHundredths: 10000, reserveHundredths: 0 },
  });

function notesOf(items: Record<string, object>) {
  const { points } = evaluateBudget(stateOf(items));
  return Object.fromEntries((points[0]?.items ?? []).map(({ item, notes }) => [item, notes]));
}

const twins = (items: Record<string, object>) =>
  Object.entries(notesOf(items)).flatMap(([item, notes]) =>
    notes.filter(({ code }) => code === "same-surface-twice").map(({ values }) => [item, values.other]),
  );

/**
 * Drag of a plate wholly turbulent from its edge, N: 0.455 / (log10 Re)^2.58 (H. Schlichting, Boundary-Layer Theory,
 * equation from memory), two faces of 0.95 m, in air of ISO 2533 at 15 °C and 101 325 Pa (ρ 1.225, μ 1.789e-5 printed).
 */
function wholePlate(length: number): number {
  const reynolds = (1.225 * 25 * length) / 1.789e-5;
  return 0.5 * 1.225 * 25 ** 2 * 2 * 0.95 * length * (0.455 / Math.log10(reynolds) ** 2.58);
}

describe("items that name the surface and the stream that they cover", () => {
  it("are both told of one another where the names agree, whatever their methods and capitals", () => {
    const items = {
      "010": plate(2.4, { surface: "Outer  face", stream: "starboard" }),
      "020": bluff({ surface: "outer face", stream: "Starboard" }),
    };
    expect(twins(items)).toEqual([
      ["010", "020"],
      ["020", "010"],
    ]);
    const [note] = notesOf(items)["020"] ?? [];
    expect(note && noteSentence(note)).toContain("Item 010 stands on the same surface (outer face)");
  });

  it("are not, on the two sides of one surface or on two surfaces", () => {
    const one = plate(2.4, { surface: "roof", stream: "outer" });
    expect(twins({ "010": one, "020": plate(2.4, { surface: "roof", stream: "inner" }) })).toEqual([]);
    expect(twins({ "010": one, "020": plate(2.4, { surface: "skirt", stream: "outer" }) })).toEqual([]);
  });

  it("are not where one lies behind the other, over however many plates: those are stretches of one surface", () => {
    const name = { surface: "roof", stream: "outer" };
    const items = {
      "010": plate(2, name),
      "020": plate(1, { ...name, liesBehind: "010", runUpFollows: true }),
      "030": plate(1.5, { ...name, liesBehind: "020", runUpFollows: true }),
    };
    expect(twins(items)).toEqual([]);
  });
});

describe("butted plates that each start afresh", () => {
  it("carry what the second would have as the rest of one plate, where it names the first", () => {
    const [note] = (notesOf({ "010": plate(2.4), "020": plate(3.6, { liesBehind: "010" }) })["020"] ?? []).filter(
      ({ code }) => code === "fresh-leading-edge-behind",
    );
    expect(note?.values.alone).toBeCloseTo(wholePlate(3.6), 2);
    expect(note?.values.onePlate).toBeCloseTo(wholePlate(6) - wholePlate(2.4), 2);
    expect(note && noteSentence(note)).toMatch(/By itself it has \d\.\d\d\sN, as the rest of one plate \d\.\d\d\sN\./);
  });

  it("carry it where both name one surface", () => {
    const name = { surface: "roof", stream: "outer" };
    const notes = notesOf({ "010": plate(2.4, name), "020": plate(3.6, name) })["020"] ?? [];
    const note = notes.find(({ code }) => code === "same-surface-twice");
    expect(note?.values.onePlate).toBeCloseTo(wholePlate(6) - wholePlate(2.4), 2);
  });

  it("are computed anew in a change of the plate ahead, whose length the note depends on", () => {
    const state = stateOf({ "010": plate(2.4), "020": plate(3.6, { liesBehind: "010" }) });
    const longer: LineEdit = { operation: "revise", kind: "item", number: "010", baseLetter: "–", body: plate(3) };
    const { after } = previewChange(state, evaluateBudget(state), [longer], []);
    const note = after.results.points[0]?.items
      .find(({ item }) => item === "020")
      ?.notes.find(({ code }) => code === "fresh-leading-edge-behind");
    expect(note?.values.onePlate).toBeCloseTo(wholePlate(6.6) - wholePlate(3), 2);
  });
});

describe("what lies behind a changed plate", () => {
  it("is found over several plates, and names the changed one", () => {
    const items = {
      "010": plate(2),
      "020": plate(1, { liesBehind: "010" }),
      "030": plate(1, { liesBehind: "020" }),
      "040": plate(1),
      "050": bluff(),
    };
    const { items: bodies } = indexState(stateOf(items));
    expect(itemsBehind(["010"], bodies)).toEqual([
      { item: "020", ahead: "010" },
      { item: "030", ahead: "010" },
    ]);
    expect(itemsBehind(["020", "010"], bodies)).toEqual([{ item: "030", ahead: "020" }]);
    expect(itemsBehind(["040", "050"], bodies)).toEqual([]);
  });
});
