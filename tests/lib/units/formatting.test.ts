import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { formatExact, formatFixed, formatPercent, formatSignificant } from "@/lib/units/format-number";
import { formatHundredths, formatNewtons, formatNewtonsChange, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatQuantity, formatRoughness, formatThickness } from "@/lib/units/format-quantity";
import { roundHundredths, roundStored, toHundredths } from "@/lib/units/rounding";

describe("newtons on a sheet", () => {
  it("print to 0.01 N with a thin space before the unit and a true minus", () => {
    expect(formatNewtons(61.586)).toBe("61.59\u2009N");
    expect(formatNewtons(-3.9)).toBe("\u22123.90\u2009N");
    expect(formatHundredths(5)).toBe("0.05");
    expect(formatHundredths(-5)).toBe("\u22120.05");
  });

  it("have no minus at zero, and a sign at every change that is none", () => {
    expect(formatNewtonsNumber(-0.004)).toBe("0.00");
    expect(formatNewtonsChange(0.4)).toBe("+0.40\u2009N");
    expect(formatNewtonsChange(-0.001)).toBe("0.00\u2009N");
  });

  it("round by their decimal digits, halves away from zero", () => {
    // The nearest doubles to 1.005 and 2.675 lie below them: rounding those would give 1.00 and 2.67.
    expect(toHundredths(1.005)).toBe(101);
    expect(toHundredths(2.675)).toBe(268);
    expect(toHundredths(-1.005)).toBe(-101);
    expect(toHundredths(1e-9)).toBe(0);
    expect(Object.is(toHundredths(-1e-9), 0)).toBe(true);
    expect(() => toHundredths(NaN)).toThrow(RangeError);
  });

  it("come back from hundredths exactly", () => {
    fc.assert(
      fc.property(fc.integer({ min: -1e9, max: 1e9 }), (hundredths) => {
        expect(toHundredths(hundredths / 100)).toBe(hundredths);
        expect(roundHundredths(hundredths / 100)).toBe(hundredths / 100);
      }),
    );
  });

  it("rounds to the double nearest to twelve decimal digits, whatever way it goes there", () => {
    const byText = (value: number): number => Number(value.toPrecision(12));
    const sized = fc
      .tuple(fc.double({ min: 0.1, max: 1, noNaN: true }), fc.integer({ min: -14, max: 16 }), fc.constantFrom(1, -1))
      .map(([digits, power, sign]) => sign * digits * 10 ** power);
    // Twelve digits and a half, a hair above it and a hair below.
    const halves = fc
      .tuple(
        fc.integer({ min: 1e11, max: 1e12 - 1 }),
        fc.integer({ min: -2, max: 2 }),
        fc.integer({ min: -22, max: 4 }),
      )
      .map(([digits, hair, power]) => Number(`${digits}.${5000 + hair}e${power}`));
    const powers = fc
      .integer({ min: -12, max: 14 })
      .chain((power) => fc.constantFrom(0.5, 0.999999999999999, 1, 1.0000000000005).map((x) => x * 10 ** power));
    fc.assert(
      fc.property(fc.oneof(sized, halves, powers), (value) => {
        expect(roundStored(value)).toBe(byText(value));
      }),
      { numRuns: 5000 },
    );
  });

  it("keep twelve significant digits before they are stored", () => {
    expect(roundStored(Math.PI * 1e5)).toBe(314159.265359);
    expect(roundStored(1 / 3)).toBe(0.333333333333);
    expect(Object.is(roundStored(-0), 0)).toBe(true);
  });
});

describe("coefficients, Reynolds numbers and thicknesses", () => {
  it.each([
    [0.0030851, "0.00309"],
    [0.3, "0.300"],
    [12.345, "12.3"],
    [4108000, "4.11 × 10⁶"],
    [1.4e7, "1.40 × 10⁷"],
    [1.789e-5, "1.79 × 10⁻⁵"],
    [999.6, "1000"],
    [12345, "1.23 × 10⁴"],
    [-45.678, "\u221245.7"],
    [0, "0"],
  ])("%d prints to three digits as %s", (value, text) => {
    expect(formatSignificant(value)).toBe(text);
  });

  it("print thicknesses in millimetres and roughness in micrometres", () => {
    expect(formatThickness(0.0246)).toBe("24.6\u2009mm");
    expect(formatRoughness(5.843e-5)).toBe("58.4\u2009µm");
  });
});

describe("values as they were given", () => {
  it("print without noise, large ones in groups of three", () => {
    expect(formatQuantity(8.2296, "length")).toBe("8.2296\u2009m");
    expect(formatQuantity(0.00015, "roughness")).toBe("150\u2009µm");
    expect(formatQuantity(288.15, "temperature")).toBe("15\u2009°C");
    expect(formatQuantity(258.15, "temperature")).toBe("\u221215\u2009°C");
    expect(formatQuantity(101325, "pressure")).toBe("101\u2009325\u2009Pa");
    expect(formatQuantity(1.79e-5, "viscosity")).toBe("1.79 × 10⁻⁵\u2009Pa·s");
    expect(formatExact(1234.5)).toBe("1234.5");
    expect(formatExact(0)).toBe("0");
  });

  it("print fractions in per cent", () => {
    expect(formatPercent(0.15)).toBe("15\u2009%");
    expect(formatPercent(0.0213636, 1)).toBe("2.1\u2009%");
    expect(formatFixed(-0.04, 1)).toBe("0.0");
  });
});
