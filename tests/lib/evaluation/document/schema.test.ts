import { describe, expect, it } from "vitest";
import { faultLine, faultsOf } from "@/lib/evaluation/document/faults";
import { EvaluationDocument } from "@/lib/evaluation/document/schema";

const POINT = { id: "p", fluid: "air", staticTemperature: 288.15, staticPressure: 101325, speed: 25 };
const PLATE = { id: "i", method: "flat-plate-friction", length: 2, breadth: 1, faces: 2 };

function faults(document: unknown): string[] {
  const parsed = EvaluationDocument.safeParse(document);
  return parsed.success ? [] : faultsOf(parsed.error).map(faultLine);
}
const itemFaults = (...items: object[]): string[] => faults({ operatingPoints: [POINT], items });
const pointFaults = (...operatingPoints: object[]): string[] => faults({ operatingPoints, items: [PLATE] });

describe("the input of an evaluation", () => {
  it("fills in what is optional", () => {
    const { items } = EvaluationDocument.parse({ operatingPoints: [POINT], items: [PLATE] });
    expect(items[0]).toEqual({
      ...PLATE,
      runUp: 0,
      roughness: 0,
      transition: { kind: "natural", criticalReynolds: 5e5 },
      frictionLine: "automatic",
      localSpeedRatio: 1,
      formFactor: 1,
    });
  });

  it.each<[string, object, string]>([
    ["length", { length: 0 }, "must be greater than 0"],
    ["length", { length: -1 }, "must be greater than 0"],
    ["length", { length: 1e-13 }, "must be at least 1e-12"],
    ["length", { length: 1.1e12 }, "must be between -1e12 and 1e12"],
    ["length", { length: "2" }, "must be a number"],
    ["length", { length: null }, "must be a number"],
    ["length", { length: undefined }, "is required"],
    ["breadth", { breadth: 0 }, "must be greater than 0"],
    ["faces", { faces: 0 }, "must be a whole number of 1 or more"],
    ["faces", { faces: 1.5 }, "must be a whole number of 1 or more"],
    ["runUp", { runUp: -0.1 }, "must be 0 or greater"],
    ["roughness", { roughness: -1e-6 }, "must be 0 or greater"],
    ["roughness", { frictionLine: "fully-rough" }, "must be greater than 0"],
    ["roughness", { frictionLine: "fully-rough-mills-hang", roughness: 0 }, "must be greater than 0"],
    ["localSpeedRatio", { localSpeedRatio: 0 }, "must be greater than 0"],
    ["formFactor", { formFactor: 0 }, "must be greater than 0"],
    ["transition.criticalReynolds", { transition: { kind: "natural", criticalReynolds: 0 } }, "must be greater than 0"],
    ["transition.at", { transition: { kind: "tripped", at: -1 } }, "must be 0 or greater"],
    ["transition.at", { transition: { kind: "laminar", at: 1 } }, "is not a field here"],
    ["transition.kind", { transition: { kind: "forced" } }, "must be one of natural, tripped, laminar"],
    ["frictionLine", { frictionLine: "blasius" }, "must be one of automatic, one-fifth-law, "],
    ["lenght", { lenght: 2 }, "is not a field here"],
    ["dragCoefficient", { dragCoefficient: 2 }, "is not a field here"],
    ["length.value", { length: { value: 0, standardUncertainty: 0.1 } }, "must be greater than 0"],
    ["length.standardUncertainty", { length: { value: 1, standardUncertainty: -0.1 } }, "must be 0 or greater"],
    ["length.standardUncertainty", { length: { value: 1 } }, "is required"],
    ["length.unit", { length: { value: 1, standardUncertainty: 0.1, unit: "m" } }, "is not a field here"],
    ["id", { id: "" }, "must not be empty"],
    ["group", { group: 3 }, "must be a text"],
    ["method", { method: "friction" }, "must be one of flat-plate-friction, duct-entry, "],
  ])("tells a fault at its own path: %s of %o", (path, change, message) => {
    const lines = itemFaults({ ...PLATE, ...change });
    expect(lines).toHaveLength(1);
    expect(lines[0]).toContain(`items[0].${path}: ${message}`);
  });

  it("tells every fault, one line each, also those between fields and items", () => {
    const lines = faults({
      operatingPoints: [{ ...POINT, speed: 0 }, POINT],
      items: [
        { ...PLATE, length: 0, frictionLine: "fully-rough", colour: 1 },
        { id: "s", method: "share", fraction: 1.2, of: ["x", "i", "i"] },
        { id: "s", method: "share", fraction: 0.1, ofGroup: "nowhere" },
      ],
      extra: 1,
    });
    expect([...lines].sort()).toEqual(
      [
        "operatingPoints[0].speed: must be greater than 0",
        "operatingPoints[1].id: must be unique: operatingPoints[0] has it too",
        "items[0].length: must be greater than 0",
        "items[0].roughness: must be greater than 0",
        "items[0].colour: is not a field here",
        "items[1].fraction: must be from 0 to 1",
        'items[1].of[0]: names no item: "x"',
        "items[1].of[2]: is named twice",
        "items[2].id: must be unique: items[1] has it too",
        'items[2].ofGroup: names no group: "nowhere"',
        "extra: is not a field here",
      ].sort(),
    );
  });

  it("asks a share for its members in one way", () => {
    const share = { id: "s", method: "share", fraction: 0.1 };
    expect(itemFaults(PLATE, share)).toEqual(["items[1].of: is required, or ofGroup in its place"]);
    expect(itemFaults({ ...PLATE, group: "g" }, { ...share, of: ["i"], ofGroup: "g" })).toEqual([
      "items[1].ofGroup: must not stand beside of: give one of the two",
    ]);
    expect(itemFaults(PLATE, { ...share, of: [] })).toEqual(["items[1].of: must name at least one item"]);
  });

  it.each([
    ["fixed", "force", {}],
    ["drag-area", "dragArea", {}],
    ["measured", "force", { testPoint: { fluid: "custom", density: 1, dynamicViscosity: 1, speed: 1 } }],
  ])("takes a negative %s for a saving only, and a saving for at most 0", (method, field, rest) => {
    const item = { id: "i", method, ...rest };
    expect(itemFaults({ ...item, [field]: -1 })).toEqual([
      `items[0].${field}: must be 0 or greater unless "saving" is true`,
    ]);
    expect(itemFaults({ ...item, [field]: 1, saving: true })).toEqual([
      `items[0].${field}: must be 0 or less for a saving`,
    ]);
    expect(itemFaults({ ...item, [field]: -1, saving: true })).toEqual([]);
    expect(itemFaults({ ...item, [field]: 0, saving: true })).toEqual([]);
    expect(itemFaults({ ...item, [field]: 0 })).toEqual([]);
  });

  it("gives air its state in one of two ways", () => {
    const air = { id: "p", fluid: "air", speed: 25 };
    expect(pointFaults({ ...air, pressureAltitude: 500 })).toEqual([]);
    expect(pointFaults({ ...air, pressureAltitude: 500, staticTemperature: 300 })).toEqual([]);
    expect(pointFaults({ ...air, staticTemperature: 300 })).toEqual([
      "operatingPoints[0].staticPressure: is required, or pressureAltitude in its place",
    ]);
    expect(pointFaults({ ...air, staticPressure: 1e5 })).toEqual(["operatingPoints[0].staticTemperature: is required"]);
    expect(pointFaults({ ...POINT, pressureAltitude: 0 })).toEqual([
      "operatingPoints[0].pressureAltitude: must not stand beside staticPressure: give one of the two",
    ]);
  });

  it.each([
    ["air", "staticTemperature", 150, 600, { staticPressure: 101325 }],
    ["air", "staticPressure", 5e3, 1e6, { staticTemperature: 288.15 }],
    ["air", "pressureAltitude", -2000, 20000, {}],
    ["fresh-water", "staticTemperature", 273.15, 373.15, {}],
    ["sea-water", "staticTemperature", 273.15, 313.15, {}],
  ])("admits %s from a %s of %f to %f", (fluid, field, min, max, rest) => {
    const at = (value: number) => pointFaults({ id: "p", fluid, speed: 1, ...rest, [field]: value });
    expect([at(min), at(max)]).toEqual([[], []]);
    for (const outside of [min - 0.01, max + 0.01]) {
      expect(at(outside)[0]).toContain(`operatingPoints[0].${field}: must be from ${min} to ${max}`);
    }
  });

  it("asks for at least one point and one item, and for an object", () => {
    expect(faults({ operatingPoints: [], items: [] })).toEqual([
      "operatingPoints: must have at least one operating point",
      "items: must have at least one item",
    ]);
    expect(faults({})).toEqual(["operatingPoints: must be a list", "items: must be a list"]);
    for (const document of [null, [], "text", 3]) expect(faults(document)).toEqual(["document: must be an object"]);
    expect(itemFaults([])).toEqual(["items[0]: must be an object"]);
  });
});
