import { describe, expect, it } from "vitest";
import type { NoteCode } from "@/lib/evaluation/notes/note-code";
import { NOTE_CODES } from "@/lib/evaluation/notes/note-code";
import {
  makeNote,
  needsJustification,
  NOTE_CATALOGUE,
  noteExcess,
  noteSentence,
} from "@/lib/evaluation/notes/note-catalogue";
import { AIR, evaluateItems, noteCodes, PLAIN, refusalOf } from "@/tests/lib/evaluation/methods/evaluate-one";

const plate = (fields: object) => ({ method: "flat-plate-friction", length: 2, breadth: 1, faces: 1, ...fields });
const duct = (fields: object) => ({ method: "duct-entry", width: 0.5, height: 0.3, length: 1, ...fields });
const tripped = (at: number) => ({ kind: "tripped", at });
const laminar = { kind: "laminar" };
const measured = (speed: number) => ({ method: "measured", force: 1, testPoint: { ...PLAIN, speed } });

/** Each code: an item (and point) that has it, and the nearest one that has it not. */
const PROVOKED: [NoteCode, object, object, object?][] = [
  ["automatic-choice", plate({}), plate({ frictionLine: "white" })],
  [
    "blasius-below-crossing",
    plate({ frictionLine: "one-fifth-law", transition: tripped(0), length: 0.015 }),
    plate({ frictionLine: "one-fifth-law", transition: tripped(0), length: 0.0152 }),
  ],
  [
    "blasius-below-crossing",
    plate({ transition: tripped(0), length: 0.0121 }),
    plate({ transition: tripped(0), length: 0.0122 }),
  ],
  ["thickness-by-wall-and-wake", plate({ frictionLine: "white" }), plate({ frictionLine: "one-seventh-law" })],
  ["regime-between", plate({ roughness: 2e-4 }), plate({ roughness: 5e-3 })],
  ["rough-line-governs-smooth-surface", plate({ roughness: 9.9e-5 }), plate({ roughness: 2e-5 })],
  ["roughness-turbulent-from-start", plate({ roughness: 1.01e-4 }), plate({ roughness: 0.99e-4 })],
  [
    "roughness-turbulent-from-start",
    plate({ roughness: 1.01e-4 }),
    plate({ roughness: 1.01e-4, transition: tripped(0) }),
  ],
  ["duct-friction-reads-low", duct({}), plate({})],
  ["fully-developed-cross-check", duct({ length: 5 }), duct({})],
  ["layers-meet-in-duct", duct({ length: 50 }), duct({})],
  [
    "reynolds-outside-line-range",
    plate({ frictionLine: "one-fifth-law", length: 10.01 }),
    plate({ frictionLine: "one-fifth-law", length: 10 }),
  ],
  ["reynolds-outside-line-range", plate({ length: 0.0999 }), plate({ length: 0.1 })],
  ["reynolds-outside-line-range", plate({ length: 1001 }), plate({ length: 1000 })],
  [
    "roughness-ratio-outside-range",
    plate({ frictionLine: "fully-rough", roughness: 0.021 }),
    plate({ frictionLine: "fully-rough", roughness: 0.019 }),
  ],
  [
    "roughness-ratio-outside-range",
    plate({ frictionLine: "momentum-integral", roughness: 0.0041 }),
    plate({ frictionLine: "momentum-integral", roughness: 0.0039 }),
  ],
  ["laminar-above-critical", plate({ transition: laminar, length: 0.51 }), plate({ transition: laminar, length: 0.5 })],
  ["laminar-above-critical", plate({ transition: { kind: "natural", criticalReynolds: 6e5 } }), plate({})],
  [
    "laminar-behind-body",
    plate({ transition: laminar, length: 0.1, runUp: 0.2 }),
    plate({ transition: laminar, length: 0.3 }),
  ],
  [
    "laminar-on-rough-surface",
    plate({ transition: laminar, roughness: 1.1e-4 }),
    plate({ transition: laminar, roughness: 0.9e-4 }),
  ],
  [
    "roughness-above-admissible",
    plate({ frictionLine: "white", roughness: 1.1e-4 }),
    plate({ frictionLine: "white", roughness: 0.9e-4 }),
  ],
  [
    "roughness-above-admissible",
    plate({ frictionLine: "white", roughness: 1.1e-4 }),
    plate({ frictionLine: "momentum-integral", roughness: 1.1e-4 }),
  ],
  [
    "fully-rough-line-on-smoother-surface",
    plate({ frictionLine: "fully-rough", roughness: 1e-3 }),
    plate({ frictionLine: "fully-rough", roughness: 5e-3 }),
  ],
  ["mach-above-limit", plate({ length: 0.5 }), plate({ length: 0.5 }), { ...AIR, speed: 103 }],
  ["measured-reynolds-differs", measured(4.9), measured(5.1)],
  ["measured-reynolds-differs", measured(20.1), measured(19.9)],
];

describe("notes of an evaluation", () => {
  it.each(PROVOKED)("%s is provoked, and absent beside it", (code, provoking, without, point) => {
    expect(noteCodes(point ?? PLAIN, provoking)).toContain(code);
    expect(noteCodes(PLAIN, without)).not.toContain(code);
  });

  it("tells Mach 0.3 by the local speed, for every method that a stream moves", () => {
    // a = 340.294 m/s at 288.15 K: 102 m/s is Mach 0.29974, 102.2 is 0.30033.
    const items = [
      plate({}),
      duct({}),
      { method: "bluff-body", dragCoefficient: 1, referenceArea: 1 },
      { method: "drag-area", dragArea: 1 },
      { method: "loss-coefficient", lossCoefficient: 1, flowArea: 1 },
    ];
    for (const item of items) {
      expect(noteCodes({ ...AIR, speed: 102 }, item)).not.toContain("mach-above-limit");
      expect(noteCodes({ ...AIR, speed: 102.2 }, item)).toContain("mach-above-limit");
    }
    expect(noteCodes({ ...AIR, speed: 60 }, { ...plate({}), localSpeedRatio: 1.8 })).toContain("mach-above-limit");
    expect(noteCodes({ ...AIR, speed: 200 }, { method: "fixed", force: 1 })).toEqual([]);
    expect(noteCodes({ ...PLAIN, speed: 200 }, plate({}))).not.toContain("mach-above-limit");
  });

  it("keeps the range of a named line quiet where the plate is held laminar", () => {
    const codes = noteCodes(PLAIN, plate({ frictionLine: "one-fifth-law", transition: laminar, length: 0.3 }));
    expect(codes).toEqual([]);
  });

  it("explains the automatic choice in one sentence", () => {
    const sentence = (fields: object): string => {
      const [item] = evaluateItems(PLAIN, [plate(fields)]);
      if (!item || "refused" in item) throw new Error("refused");
      return item.notes.find(({ code }) => code === "automatic-choice")?.sentence ?? "";
    };
    expect(sentence({})).toMatch(/^The automatic choice took Prandtl–Schlichting: /);
    expect(sentence({ roughness: 1e-3 })).toMatch(/^The automatic choice took Schlichting, fully rough: /);
    expect(sentence({ length: 0.3 })).toMatch(/^The automatic choice took Blasius: the layer is laminar/);
    for (const fields of [{}, { roughness: 1e-3 }, { length: 0.3 }])
      expect(sentence(fields).match(/\./g)?.length).toBeGreaterThan(0);
  });

  it("refuses with a sentence", () => {
    expect(refusalOf(PLAIN, plate({ length: 1e5 }))).toMatch(/outside every friction line/);
    expect(refusalOf(PLAIN, plate({ transition: tripped(0.001) }))).toMatch(/is below Re 10000/);
    expect(refusalOf(PLAIN, duct({ height: 0.001 }))).toMatch(/^The layers block the duct/);
  });
});

describe("the note catalogue", () => {
  const values = {
    line: "white",
    reynolds: 2e6,
    min: 1,
    max: 1e6,
    lengthOverRoughness: 2e6,
    laminarReynolds: 1e6,
    criticalReynolds: 5e5,
    runUp: 1,
    roughness: 2e-4,
    admissibleRoughness: 1e-4,
    verdict: "between",
    roughnessReynolds: 35,
    thickness: 0.1,
    shorterSide: 0.1,
    mach: 0.6,
    staticTemperature: 312.15,
    staticPressure: 1e5,
    limit: 0.3,
    ratio: 4,
    behind: "010",
    other: "020",
    reason: "smooth",
    drag: 2,
    crossing: 1e4,
    momentumIntegralDrag: 1.9,
    difference: -0.05,
    coreSpeedRatio: 1.1,
    dynamicPressureExcess: 0.21,
    lengthOverDiameter: 12,
    developedDrag: 3,
    transitionReynolds: 5e3,
    displacementThickness: 0.06,
    circle: "a → a",
    item: "a",
  };

  it("gives every code a severity, and a sentence whose values are all filled in", () => {
    for (const code of NOTE_CODES) {
      const sentence = noteSentence(makeNote(code, values));
      expect(sentence, code).toMatch(/^[A-ZΑ-Ωδ].*\.$/);
      expect(sentence, code).not.toMatch(/undefined|NaN|\?/);
    }
  });

  it("asks for a justification of every caution and of nothing else", () => {
    for (const code of NOTE_CODES) {
      expect(needsJustification(makeNote(code)), code).toBe(NOTE_CATALOGUE[code].severity === "caution");
    }
  });

  it("measures by how much a caution exceeds, so that growth can be told", () => {
    expect(noteExcess(makeNote("reynolds-outside-line-range", { ...values, reynolds: 2e6 }))).toBe(2);
    expect(noteExcess(makeNote("reynolds-outside-line-range", { ...values, reynolds: 0.5 }))).toBe(2);
    expect(noteExcess(makeNote("laminar-above-critical", values))).toBe(2);
    expect(noteExcess(makeNote("roughness-above-admissible", values))).toBe(2);
    expect(noteExcess(makeNote("mach-above-limit", values))).toBe(2);
    // 12 K beyond a range of 12 K.
    expect(noteExcess(makeNote("humid-air-outside-range", values))).toBe(2);
    expect(noteExcess(makeNote("measured-reynolds-differs", { ratio: 0.25 }))).toBe(2);
    expect(noteExcess(makeNote("fully-rough-line-on-smoother-surface", values))).toBe(2);
    expect(noteExcess(makeNote("layers-meet-in-duct", values))).toBe(2);
    expect(noteExcess(makeNote("same-surface-twice", values))).toBe(1);
  });

  it("never shows words that belong to codes of practice", () => {
    for (const code of NOTE_CODES)
      expect(noteSentence(makeNote(code, values))).not.toMatch(/design wind|certified|compliant/i);
  });
});
