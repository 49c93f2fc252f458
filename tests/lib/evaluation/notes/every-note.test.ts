import { describe, expect, it } from "vitest";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { NOTE_CODES, type NoteCode } from "@/lib/evaluation/notes/note-code";
import { budget, item, share } from "@/tests/lib/evaluation/uncertainty/uncertain-budget";

/** A custom fluid in which Re of a length is 1e6 times that length, at 10 m/s. */
const PLAIN = { fluid: "custom", density: { value: 1 }, dynamicViscosity: { value: 1e-5 }, speed: { value: 10 } };
const AIR = {
  fluid: "air",
  staticTemperature: { value: 288.15 },
  staticPressure: { value: 101325 },
  speed: { value: 25 },
};

interface Setting {
  items: Record<string, object>;
  point?: object;
}

/** Each code: a budget in which an item has it, and the nearest one in which none has. A code without a row does not compile. */
const EVERY_NOTE: Record<NoteCode, { provoking: Setting; quiet: Setting }> = {
  "automatic-choice": { provoking: plates({}), quiet: plates({ frictionLine: "white" }) },
  "blasius-below-crossing": {
    provoking: plates({ frictionLine: "one-fifth-law", transition: "tripped", length: { value: 0.015 } }),
    quiet: plates({ frictionLine: "one-fifth-law", transition: "tripped", length: { value: 0.0152 } }),
  },
  "thickness-by-wall-and-wake": {
    provoking: plates({ frictionLine: "white" }),
    quiet: plates({ frictionLine: "one-seventh-law" }),
  },
  "regime-between": { provoking: rough(2e-4), quiet: rough(5e-3) },
  "rough-line-governs-smooth-surface": { provoking: rough(9.9e-5), quiet: rough(2e-5) },
  "roughness-turbulent-from-start": { provoking: rough(1.01e-4), quiet: rough(0.99e-4) },
  "duct-friction-reads-low": { provoking: duct({}), quiet: plates({}) },
  "fully-developed-cross-check": { provoking: duct({ length: { value: 5 } }), quiet: duct({}) },
  "reynolds-outside-line-range": {
    provoking: plates({ frictionLine: "one-fifth-law", length: { value: 10.01 } }),
    quiet: plates({ frictionLine: "one-fifth-law", length: { value: 10 } }),
  },
  "roughness-ratio-outside-range": {
    provoking: rough(0.021, { frictionLine: "fully-rough" }),
    quiet: rough(0.019, { frictionLine: "fully-rough" }),
  },
  "laminar-above-critical": {
    provoking: plates({ transition: "laminar", length: { value: 0.51 } }),
    quiet: plates({ transition: "laminar", length: { value: 0.5 } }),
  },
  "laminar-behind-body": {
    provoking: plates({ transition: "laminar", length: { value: 0.1 }, runUp: { value: 0.2 } }),
    quiet: plates({ transition: "laminar", length: { value: 0.3 } }),
  },
  "laminar-on-rough-surface": {
    provoking: rough(1.1e-4, { transition: "laminar" }),
    quiet: rough(0.9e-4, { transition: "laminar" }),
  },
  "roughness-above-admissible": {
    provoking: rough(1.1e-4, { frictionLine: "white" }),
    quiet: rough(0.9e-4, { frictionLine: "white" }),
  },
  "fully-rough-line-on-smoother-surface": {
    provoking: rough(1e-3, { frictionLine: "fully-rough" }),
    quiet: rough(5e-3, { frictionLine: "fully-rough" }),
  },
  "layers-meet-in-duct": { provoking: duct({ length: { value: 50 } }), quiet: duct({}) },
  // a = 340.294 m/s at 288.15 K (ISO 2533): 102 m/s is Mach 0.29974, 102.2 is 0.30033.
  "mach-above-limit": {
    provoking: { ...plates({}), point: { ...AIR, speed: { value: 102.2 } } },
    quiet: { ...plates({}), point: { ...AIR, speed: { value: 102 } } },
  },
  "humid-air-outside-range": {
    provoking: { ...plates({}), point: { ...AIR, staticTemperature: { value: 288.1 }, relativeHumidity: 0.5 } },
    quiet: { ...plates({}), point: { ...AIR, relativeHumidity: 0.5 } },
  },
  "measured-reynolds-differs": { provoking: measured(4.9), quiet: measured(5.1) },
  "fresh-leading-edge-behind": {
    provoking: twoPlates({ liesBehind: "010", runUpFollows: false }),
    quiet: twoPlates({ liesBehind: "010", runUpFollows: true }),
  },
  "same-surface-twice": { provoking: twoPlates({}), quiet: twoPlates({ breadth: { value: 0.9 } }) },
  "reynolds-outside-every-line": {
    provoking: plates({ length: { value: 1e4 * 1.001 } }),
    quiet: plates({ length: { value: 1e4 } }),
  },
  "transition-below-limit": { provoking: tripped(0.0099), quiet: tripped(0.01) },
  "duct-blocked": { provoking: duct({ height: { value: 0.001 } }), quiet: duct({}) },
  "share-circle": {
    provoking: { items: { "010": share(0.1, ["020"], null), "020": share(0.1, ["010"], null) } },
    quiet: { items: { "010": share(0.1, ["020"], null), "020": plate({}) } },
  },
  "share-of-refused": {
    provoking: { items: { "010": share(0.1, ["020"], null), "020": plate({ length: { value: 1e5 } }) } },
    quiet: { items: { "010": share(0.1, ["020"], null), "020": plate({}) } },
  },
};

function plate(fields: object): object {
  const sizes = { length: { value: 2 }, breadth: { value: 1 }, faces: 1, roughness: { value: 0 } };
  return item("flat-plate-friction", { ...sizes, ...fields });
}

function plates(fields: object): Setting {
  return { items: { "010": plate(fields) } };
}

function rough(roughness: number, fields: object = {}): Setting {
  return plates({ roughness: { value: roughness }, ...fields });
}

function tripped(at: number): Setting {
  return plates({ transition: "tripped", trippedAt: { value: at } });
}

function twoPlates(second: object): Setting {
  return { items: { "010": plate({}), "020": plate(second) } };
}

function duct(fields: object): Setting {
  const sizes = { width: { value: 0.5 }, height: { value: 0.3 }, length: { value: 1 }, roughness: { value: 0 } };
  return { items: { "010": item("duct-entry", { ...sizes, ...fields }) } };
}

function measured(speed: number): Setting {
  const test = { testFluid: "custom", testDensity: { value: 1 }, testDynamicViscosity: { value: 1e-5 } };
  const report = { testSpeed: { value: speed }, testDate: "2026-01-01", source: "Test" };
  return { items: { "010": item("measured", { force: { value: 1 }, ...test, ...report }) } };
}

function codesOf({ items, point = PLAIN }: Setting): string[] {
  const results = evaluateBudget(budget(items, { point }));
  return results.points.flatMap((each) => each.items.flatMap(({ notes }) => notes.map(({ code }) => code)));
}

describe("every note of the catalogue", () => {
  it.each(NOTE_CODES)("%s is provoked in a budget, and absent in the nearest one without its cause", (code) => {
    const { provoking, quiet } = EVERY_NOTE[code];
    expect(codesOf(provoking)).toContain(code);
    expect(codesOf(quiet)).not.toContain(code);
  });
});
