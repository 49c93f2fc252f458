import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { DimensionName } from "@/lib/units/dimensions";
import { formatQuantity } from "@/lib/units/format-quantity";
import { parseNumber, parseQuantity } from "@/lib/units/parse-quantity";

// Factors: NIST SP 811 (2008), appendix B.8 (boldface there: exact), B.9 and its temperature formulas.
const READ: [typed: string, dimension: DimensionName, si: number][] = [
  ["8.2 m", "length", 8.2],
  ["820 cm", "length", 8.2],
  ["8200mm", "length", 8.2],
  ["1 ft", "length", 0.3048],
  ["27 ft", "length", 8.2296],
  ["1 in", "length", 0.0254],
  ["1 mil", "length", 2.54e-5],
  ["1 yd", "length", 0.9144],
  ["1 mi", "length", 1609.344],
  ["90 km/h", "speed", 25],
  ["90 kph", "speed", 25],
  ["1 kt", "speed", 0.514444444444444],
  ["1 mph", "speed", 0.44704],
  ["1 ft/s", "speed", 0.3048],
  ["15 °C", "temperature", 288.15],
  ["−15 °C", "temperature", 258.15],
  ["15 C", "temperature", 288.15],
  ["59 °F", "temperature", 288.15],
  ["300 K", "temperature", 300],
  ["300", "temperature", 300],
  ["0.15 mm", "roughness", 0.00015],
  ["150 µm", "roughness", 0.00015],
  ["150 \u03bcm", "roughness", 0.00015],
  ["6 um", "roughness", 6e-6],
  ["1013 hPa", "pressure", 101300],
  ["1 013.25 hPa", "pressure", 101325],
  ["1 bar", "pressure", 1e5],
  ["1 psi", "pressure", 6894.757],
  ["1 atm", "pressure", 101325],
  ["1 inHg", "pressure", 3386.389],
  ["1 ft²", "area", 0.09290304],
  ["1 ft2", "area", 0.09290304],
  ["1 sqft", "area", 0.09290304],
  ["40 cm^2", "area", 0.004],
  ["1 lbf", "force", 4.448222],
  ["1 kgf", "force", 9.80665],
  ["2.5 kN", "force", 2500],
  ["1 lb/ft³", "density", 16.01846],
  ["1 slug/ft3", "density", 515.3788],
  ["1 g/cm³", "density", 1000],
  ["1.79e-5 Pa·s", "viscosity", 1.79e-5],
  ["1.79 × 10⁻⁵ Pa s", "viscosity", 1.79e-5],
  ["1.79 x 10^-5 kg/(m s)", "viscosity", 1.79e-5],
  ["1 cP", "viscosity", 1e-3],
  ["8.2", "length", 8.2],
  ["-5", "force", -5],
];

const REFUSED: [typed: string, dimension: DimensionName, sentence: string][] = [
  ["3 kg", "length", "kg is a mass; a length is needed, for example 8.2 m."],
  ["5 s2", "length", "s2 is something else; a length is needed, for example 8.2 m."],
  ["5 m/s2", "speed", "m/s2 is an acceleration; a speed is needed, for example 90 km/h."],
  [
    "1.5e-5 m2/s",
    "viscosity",
    "m2/s is a kinematic viscosity; a dynamic viscosity is needed, for example 1.79e-5 Pa·s.",
  ],
  ["8 m", "temperature", "m is a length; a temperature is needed, for example 15 °C."],
  ["12 abc", "length", '"abc" is no unit known here; a length is needed, for example 8.2 m.'],
  ["5 constructor", "length", '"constructor" is no unit known here; a length is needed, for example 8.2 m.'],
  ["5 fathom", "length", '"fathom" is no unit known here; a length is needed, for example 8.2 m.'],
  ["", "length", "Give a length, for example 8.2 m."],
  ["m", "length", "This is no number with a unit; a length is needed, for example 8.2 m."],
  ["NaN", "force", "This is no number with a unit; a force is needed, for example 12.5 N."],
  ["Infinity m", "length", "This is no number with a unit; a length is needed, for example 8.2 m."],
  ["1e999 m", "length", "Too large: beyond 10¹²."],
  ["1e13 N", "force", "Too large: beyond 10¹²."],
  ["150", "roughness", "Rougher than 0.1 m: name the unit, for example 150 µm."],
];

describe("a quantity as it is typed", () => {
  it.each(READ)("%s as %s is %d in SI, and the text is kept", (typed, dimension, si) => {
    const read = parseQuantity(typed, dimension);
    if (!read.ok) throw new Error(read.sentence);
    // NIST prints inexact factors to seven digits.
    expect(Math.abs(read.quantity.value - si)).toBeLessThanOrEqual(Math.abs(si) * 5e-7);
    expect(read.quantity.entered).toBe(typed);
  });

  it.each(REFUSED)("%s as %s is refused", (typed, dimension, sentence) => {
    expect(parseQuantity(typed, dimension)).toEqual({ ok: false, sentence });
  });

  it.each(["8,2 m", "1,013 hPa", "1,013.25"])("%s is refused, as its comma can be read two ways", (typed) => {
    expect(parseQuantity(typed, "pressure")).toMatchObject({ ok: false });
    expect(parseNumber(typed)).toMatchObject({ ok: false });
  });

  it.each(["12 34 m", "5 m 3 cm", "0x10 m", "1/2 in", "5 m/", "5 (m)", "5 %", "5 m" + " ".repeat(40) + "x"])(
    "%s is refused",
    (typed) => expect(parseQuantity(typed, "length")).toMatchObject({ ok: false }),
  );

  it("converts by exact factors without noise in the last digits", () => {
    expect(parseQuantity("59 °F", "temperature")).toMatchObject({ quantity: { value: 288.15 } });
    expect(parseQuantity("27 ft", "length")).toMatchObject({ quantity: { value: 8.2296 } });
    expect(parseQuantity("150 µm", "roughness")).toMatchObject({ quantity: { value: 0.00015 } });
  });

  it("never throws and never lets through what is no finite number, whatever is typed", () => {
    const dimensions = fc.constantFrom<DimensionName>("length", "speed", "temperature", "viscosity", "force");
    const pieces = fc.constantFrom(
      "5",
      "1e3",
      " ",
      "m",
      "/",
      "s",
      "°C",
      "×10",
      "⁻⁵",
      "-",
      ".",
      "toString",
      "2",
      "*",
      "^",
    );
    const texts = fc.oneof(
      fc.string(),
      fc.array(pieces, { maxLength: 8 }).map((parts) => parts.join("")),
    );
    fc.assert(
      fc.property(texts, dimensions, (typed, dimension) => {
        const read = parseQuantity(typed, dimension);
        expect(read.ok ? Number.isFinite(read.quantity.value) : read.sentence.length > 0).toBe(true);
      }),
      { numRuns: 2000 },
    );
  });

  it("reads back what it prints", () => {
    const dimensions = fc.constantFrom<DimensionName>("length", "area", "speed", "pressure", "force", "density");
    const values = fc.double({ min: 1e-6, max: 1e9, noNaN: true });
    fc.assert(
      fc.property(values, dimensions, (value, dimension) => {
        const read = parseQuantity(formatQuantity(value, dimension), dimension);
        expect(read.ok).toBe(true);
        if (read.ok) expect(Math.abs(read.quantity.value - value)).toBeLessThanOrEqual(value * 1e-11);
      }),
    );
  });
});

describe("a plain number as it is typed", () => {
  it("takes decimals, powers of ten and the true minus", () => {
    expect(parseNumber("0.30")).toEqual({ ok: true, value: 0.3 });
    expect(parseNumber("5 × 10⁵")).toEqual({ ok: true, value: 500000 });
    expect(parseNumber("\u22121.5e-3")).toEqual({ ok: true, value: -0.0015 });
  });

  it("refuses a unit, nothing at all and what is too large", () => {
    expect(parseNumber("3 m")).toEqual({ ok: false, sentence: 'A plain number is needed here, without "m".' });
    expect(parseNumber(" ")).toEqual({ ok: false, sentence: "Give a number." });
    expect(parseNumber("1e13")).toMatchObject({ ok: false });
  });
});
