import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { dryAir } from "@/lib/aero/fluids/dry-air";
import { humidAir } from "@/lib/aero/fluids/humid-air";
import { CIPM_PRESSURES, CIPM_TEMPERATURES, vapourFraction } from "@/lib/aero/fluids/humid-air-density";
import { expectRelative } from "@/tests/support/relative";

const temperature = fc.double({ ...CIPM_TEMPERATURES, noNaN: true });
const pressure = fc.double({ ...CIPM_PRESSURES, noNaN: true });
const humidity = fc.double({ min: 0, max: 1, noNaN: true });

/**
 * Another road to the density: an ideal mixture of dry air and steam, with Magnus' formula for the pressure of
 * saturation over water (WMO no. 8, 6.112 hPa, 17.62, 243.12 °C).
 */
function idealMixture(T: number, p: number, h: number): number {
  const t = T - 273.15;
  const vapour = h * 611.2 * Math.exp((17.62 * t) / (243.12 + t));
  return (p - vapour) / (287.05287 * T) + vapour / (461.523 * T);
}

describe("humid air", () => {
  it("is an ideal mixture within 0.2 % over the whole stated range", () => {
    fc.assert(
      fc.property(temperature, pressure, humidity, (T, p, h) => {
        expectRelative(humidAir(T, p, h).density, idealMixture(T, p, h), 2e-3);
      }),
    );
  });

  it("gets lighter and faster for sound with every part of vapour, and keeps its viscosity", () => {
    fc.assert(
      fc.property(temperature, pressure, fc.double({ min: 0, max: 0.99, noNaN: true }), (T, p, h) => {
        const [drier, moister] = [humidAir(T, p, h), humidAir(T, p, h + 0.01)];
        expect(moister.density).toBeLessThan(drier.density);
        expect(moister.speedOfSound ?? 0).toBeGreaterThan(drier.speedOfSound ?? Infinity);
        expect(moister.dynamicViscosity).toBe(dryAir(T, p).dynamicViscosity);
      }),
    );
  });

  it("is within 0.05 % of a perfect gas where it is dry", () => {
    fc.assert(
      fc.property(temperature, pressure, (T, p) => {
        expectRelative(humidAir(T, p, 0).density, dryAir(T, p).density, 5e-4);
      }),
    );
  });

  it("carries sound at 20 °C and half humidity at 344.0 m/s (Cramer, J. Acoust. Soc. Am. 93 (1993); from memory)", () => {
    expect(Math.abs((humidAir(293.15, 101325, 0.5).speedOfSound ?? 0) - 343.99)).toBeLessThan(0.3);
  });

  it("has no density where the vapour would press more than the whole", () => {
    expect(vapourFraction(400, 101325, 1)).toBeGreaterThan(1);
    expect(() => humidAir(400, 101325, 1)).toThrow(RangeError);
  });
});
