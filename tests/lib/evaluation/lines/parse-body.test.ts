import { describe, expect, it } from "vitest";
import { parseBody } from "@/lib/evaluation/lines/parse-body";
import { newTerms } from "@/lib/evaluation/lines/terms-body";
import type { LineKind } from "@/lib/vocabulary/lines";

const ITEM = { name: "Front panels", ownerId: 1, order: 10, grade: "estimated", methodVersion: 1 };
const PLATE = {
  ...ITEM,
  method: "flat-plate-friction",
  length: { value: 2.4, entered: "240 cm" },
  breadth: { value: 0.95 },
  faces: 2,
  roughness: { value: 6e-6 },
};
const BODY = { ...ITEM, method: "bluff-body", dragCoefficient: 0.3, referenceArea: { value: 0.06 }, source: "White" };
const FIXED = { ...ITEM, method: "fixed", force: { value: 3 }, source: "judgement" };
const MEASURED = {
  ...ITEM,
  method: "measured",
  force: { value: 3 },
  testTemperature: { value: 288.15 },
  testPressure: { value: 101325 },
  testSpeed: { value: 30 },
  testDate: "2026-02-01",
  source: "Report 12",
};
const SHARE = { ...ITEM, method: "share", fraction: 0.05, of: ["010"], source: "judgement" };
const POINT = {
  name: "Cruise",
  fluid: "air",
  staticTemperature: { value: 288.15 },
  staticPressure: { value: 101325 },
  speed: { value: 25 },
};
const TERMS = newTerms({ referenceOperatingPoint: "OP-1", reserveHundredths: 300 });

function faultsOf(kind: LineKind, body: unknown): Record<string, string> {
  const parsed = parseBody(kind, body);
  return parsed.ok ? {} : Object.fromEntries(parsed.faults.map(({ path, sentence }) => [path, sentence]));
}

describe("a body from outside", () => {
  it.each([PLATE, BODY, FIXED, MEASURED, SHARE])("is taken when it is whole: $method", (body) => {
    expect(faultsOf("item", body)).toEqual({});
  });

  it("keeps what was typed and fills in what may be left out", () => {
    const parsed = parseBody("item", PLATE);
    expect(parsed).toMatchObject({
      ok: true,
      content: { body: { length: { value: 2.4, entered: "240 cm" }, transition: "natural", criticalReynolds: 500000 } },
    });
  });

  it.each<[string, LineKind, object, string, string]>([
    ["no length", "item", { ...PLATE, length: null }, "length", "Give a value."],
    ["a length of 0", "item", { ...PLATE, length: { value: 0 } }, "length", "Must be greater than 0."],
    ["a length as text", "item", { ...PLATE, length: { value: "2.4" } }, "length", "Give a number."],
    [
      "a text that can't be read",
      "item",
      { ...PLATE, length: { entered: "3 kg" } },
      "length",
      "kg is a mass; a length is needed, for example 8.2 m.",
    ],
    [
      "a text that says something else than its value",
      "item",
      { ...PLATE, length: { value: 24, entered: "240 cm" } },
      "length",
      '"240 cm" is not the value beside it: type it again.',
    ],
    [
      "a roughness in µm without its unit",
      "finish",
      { name: "paint", roughness: { value: 6 }, source: "x" },
      "roughness",
      "Rougher than 0.1 m: check the unit.",
    ],
    ["half a face", "item", { ...PLATE, faces: 1.5 }, "faces", "Give a whole number of faces."],
    ["no method", "item", ITEM, "method", "Choose a method."],
    ["no owner", "item", { ...PLATE, ownerId: null }, "ownerId", "Choose the owner."],
    ["a blank name", "item", { ...PLATE, name: "  " }, "name", "Give the item a name."],
    ["an unknown field", "item", { ...PLATE, lenght: 3 }, "lenght", "Is no field of this line."],
    [
      "a finish and a roughness",
      "item",
      { ...PLATE, finish: "F10" },
      "roughness",
      "Choose a finish or type a roughness, not both.",
    ],
    [
      "no roughness at all",
      "item",
      { ...PLATE, roughness: null },
      "roughness",
      "Choose a finish from the catalogue or type a roughness (0 for a smooth surface).",
    ],
    [
      "a fully rough line without roughness",
      "item",
      { ...PLATE, roughness: { value: 0 }, frictionLine: "fully-rough" },
      "roughness",
      "A fully rough line needs a roughness greater than 0.",
    ],
    [
      "a run-up that follows nobody",
      "item",
      { ...PLATE, runUpFollows: true },
      "liesBehind",
      "Say which item it lies behind, or type the run-up.",
    ],
    [
      "shelter without a reason",
      "item",
      { ...BODY, shelterFactor: 0.7 },
      "shelterReason",
      "Say what shelters it: the factor is not 1.",
    ],
    [
      "another coefficient than its shape's",
      "item",
      { ...BODY, shape: "cube-face-on-white" },
      "dragCoefficient",
      "The catalogue has 1.07 for this shape: choose no shape for a coefficient of your own.",
    ],
    ["a shape of no catalogue", "item", { ...BODY, shape: "banana" }, "shape", "Choose a shape of the catalogue."],
    ["no source", "item", { ...BODY, source: "" }, "source", "Say where the drag coefficient comes from."],
    [
      "a negative force that is no saving",
      "item",
      { ...FIXED, force: { value: -3 } },
      "force",
      "Negative only on an item that is marked as a saving.",
    ],
    ["a saving above 0", "item", { ...FIXED, saving: true }, "force", "A saving is 0 or negative."],
    [
      "a test without its pressure",
      "item",
      { ...MEASURED, testPressure: null },
      "testPressure",
      "Give a pressure or an altitude.",
    ],
    [
      "a test in Celsius for kelvin",
      "item",
      { ...MEASURED, testTemperature: { value: 15 } },
      "testTemperature",
      "Air is admitted from 150 to 600 K (−123.15 to 326.85 °C).",
    ],
    [
      "a day that no month has",
      "item",
      { ...MEASURED, testDate: "2026-02-30" },
      "testDate",
      "Give a date such as 2026-03-31.",
    ],
    ["a share of nothing", "item", { ...SHARE, of: [] }, "of", "Name the items, or a group, that it is a share of."],
    ["a share of items and a group", "item", { ...SHARE, ofGroup: "G10" }, "of", "Name items or a group, not both."],
    ["a share above all", "item", { ...SHARE, fraction: 1.2 }, "fraction", "At most 1, which is 100 %."],
    [
      "pressure and altitude",
      "operating_point",
      { ...POINT, pressureAltitude: { value: 0 } },
      "pressureAltitude",
      "Give a pressure or an altitude, not both.",
    ],
    [
      "water with a pressure",
      "operating_point",
      { ...POINT, fluid: "fresh-water" },
      "staticPressure",
      "Does not belong to this fluid: leave it empty.",
    ],
    ["custom without density", "operating_point", { ...POINT, fluid: "custom" }, "density", "Needed for this fluid."],
    ["a limit of 0", "operating_point", { ...POINT, limitHundredths: 0 }, "limitHundredths", "Must be greater than 0."],
    [
      "half a hundredth",
      "operating_point",
      { ...POINT, limitHundredths: 0.5 },
      "limitHundredths",
      "Give newtons to 0.01 N.",
    ],
    [
      "no reserve at the reference",
      "terms",
      { ...TERMS, reserves: [] },
      "reserves",
      "The reference operating point needs a reserve; it may be 0.",
    ],
    [
      "no reviewer",
      "terms",
      { ...TERMS, reviewRules: { ...TERMS.reviewRules, reviewers: 0 } },
      "reviewRules.reviewers",
      "Never fewer than one independent reviewer.",
    ],
    [
      "a place that is no time zone",
      "terms",
      { ...TERMS, timeZone: "Mars/Olympus" },
      "timeZone",
      "Name a time zone such as Europe/Amsterdam.",
    ],
    ["a count of another size", "terms", { ...TERMS, countSize: 0.01 }, "countSize", "Choose 0.001 or 0.0001."],
    [
      "unallocated below zero",
      "allocations",
      { rows: [], unallocatedHundredths: -1 },
      "unallocatedHundredths",
      "Unallocated may not go below zero.",
    ],
  ])("with %s is told so at its field", (_, kind, body, path, sentence) => {
    expect(faultsOf(kind, body)).toMatchObject({ [path]: sentence });
  });

  it.each([null, undefined, 7, "item", []])("that is no record is refused: %s", (body) => {
    expect(parseBody("item", body).ok).toBe(false);
    expect(parseBody("finish", body).ok).toBe(false);
  });

  it("tells every fault at once", () => {
    expect(Object.keys(faultsOf("item", { ...PLATE, name: "", length: { value: -1 }, faces: 0 }))).toEqual(
      expect.arrayContaining(["name", "length", "faces"]),
    );
  });
});
