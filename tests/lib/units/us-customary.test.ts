import { describe, expect, it } from "vitest";
import { formatQuantity, formatThickness, formatUsQuantity } from "@/lib/units/format-quantity";
import { parseQuantity } from "@/lib/units/parse-quantity";
import { inUsUnits, US_UNITS, usPerSi } from "@/lib/units/us-customary";

/** NIST SP 811 (2008), appendix B.8, "to convert from … to …, multiply by", seven digits as printed there. */
const NIST = {
  length: 3.048e-1, // foot → metre
  altitude: 3.048e-1, // foot → metre
  roughness: 2.54e-5, // mil (0.001 inch) → metre
  thickness: 2.54e-2, // inch → metre
  area: 9.290304e-2, // square foot → square metre
  speed: 4.4704e-1, // mile per hour → metre per second
  ductSpeed: 3.048e-1, // foot per second → metre per second
  pressure: 4.788026e1, // pound-force per square foot → pascal
  density: 1.601846e1, // pound per cubic foot → kilogram per cubic metre
  viscosity: 1.488164, // pound per foot second → pascal second
  kinematicViscosity: 9.290304e-2, // square foot per second → square metre per second
  force: 4.448222, // pound-force → newton
  power: 7.456999e2, // horsepower (550 ft·lbf/s) → watt
} as const;

describe("US customary units", () => {
  it.each(Object.entries(NIST))("has the factor of NIST SP 811 for %s", (name, siPerUs) => {
    const dimension = Object.keys(NIST).includes(name) ? (name as keyof typeof NIST) : "length";
    // Half of the seventh digit that is printed there.
    expect(Math.abs(usPerSi(dimension) * siPerUs - 1)).toBeLessThan(5e-7);
    expect(Math.abs(inUsUnits(12.5, dimension) / (12.5 / siPerUs) - 1)).toBeLessThan(5e-7);
  });

  it("shifts temperatures: t/°F = T/K × 1.8 − 459.67, by NIST SP 811, B.8", () => {
    expect(inUsUnits(273.15, "temperature")).toBeCloseTo(32, 9);
    expect(inUsUnits(373.15, "temperature")).toBeCloseTo(212, 9);
    expect(inUsUnits(233.15, "temperature")).toBeCloseTo(-40, 9);
  });

  it("prints the SI value beside, with everything that was given", () => {
    expect(formatQuantity(8.2296, "length", "us")).toBe("27\u2009ft (8.2296\u2009m)");
    expect(formatQuantity(288.15, "temperature", "us")).toBe("59\u2009°F (15\u2009°C)");
    expect(formatQuantity(25, "speed", "us")).toBe("55.92\u2009mph (25\u2009m/s)");
    expect(formatQuantity(101325, "pressure", "us")).toBe("2116\u2009lbf/ft² (101\u2009325\u2009Pa)");
    expect(formatThickness(0.0246, "us")).toBe("0.969\u2009in (24.6\u2009mm)");
    expect(formatQuantity(8.2296, "length")).toBe("8.2296\u2009m");
  });

  it("may be typed as it is printed, in every field", () => {
    const fields = [
      ["length", 8.2296],
      ["roughness", 0.000127],
      ["altitude", 1200],
      ["area", 0.06],
      ["speed", 25],
      ["temperature", 288.15],
      ["pressure", 101325],
      ["density", 1.225],
      ["viscosity", 1.79e-5],
      ["force", 12.5],
    ] as const;
    for (const [dimension, value] of fields) {
      const read = parseQuantity(formatUsQuantity(value, dimension), dimension);
      expect(read.ok ? Math.abs(read.quantity.value / value - 1) : read.sentence).toBeLessThan(5e-4);
    }
    expect(US_UNITS.roughness.printed).toBe("mil");
  });
});
