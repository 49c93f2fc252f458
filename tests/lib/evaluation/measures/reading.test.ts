import { describe, expect, it } from "vitest";
import {
  type MeasureBasis,
  measureBasis,
  measuresOffered,
  missingMeasureSentence,
} from "@/lib/evaluation/measures/measure-basis";
import { NEWTONS, readingOf, readNumber, readText, readTick } from "@/lib/evaluation/measures/reading";
import { toHundredths } from "@/lib/units/rounding";
import type { Measure } from "@/lib/vocabulary/measures";

// ρ = 1.225 kg/m³, U = 25 m/s: q = 382.8125 Pa.
const MOVING: MeasureBasis = measureBasis(
  "vehicle_fairing",
  { countSize: 0.001, referenceArea: { value: 10 }, flowArea: null },
  { dynamicPressure: 382.8125, speed: 25 },
  1000,
);
const DUCT: MeasureBasis = { ...MOVING, kind: "duct", referenceArea: null, flowArea: 3 };

function read(measure: Measure, newtons: number, basis = MOVING, system: "si" | "us" = "si"): string | null {
  const reading = readingOf(measure, basis, system);
  return reading && readText(reading, newtons).replace(/[\u2009\u00a0]/g, " ");
}

describe("a force in another measure", () => {
  // C_D·A = D/q, C_D = C_D·A/A, counts = C_D/c, power = D·U, energy = power × hours, Δp = D/A_flow: worked by hand.
  it("is read by the definitions of product.md", () => {
    expect(read("newtons", 38.28125)).toBe("38.28 N");
    expect(read("drag-area", 38.28125)).toBe("0.10000 m²");
    expect(read("coefficient", 38.28125)).toBe("0.0100");
    expect(read("counts", 38.28125)).toBe("10.000 counts");
    expect(read("power", 38.28125)).toBe("957.0 W");
    expect(read("energy", 38.28125)).toBe("957.0 kWh/year");
    expect(read("pascals", 180, DUCT)).toBe("60.0 Pa");
  });

  it("has ten times as many counts where a count is 0.0001", () => {
    expect(read("counts", 38.28125, { ...MOVING, countSize: 0.0001 })).toBe("100.00 counts");
  });

  // NIST SP 811 (2008), B.8: lbf 4.448222 N, ft² 0.09290304 m², hp 745.6999 W, lbf/ft² 47.88026 Pa.
  it("is read in US customary units by the factors of NIST SP 811", () => {
    expect(read("newtons", 38.28125, MOVING, "us")).toBe(`${(38.28125 / 4.448222).toFixed(3)} lbf`);
    expect(read("drag-area", 38.28125, MOVING, "us")).toBe(`${(0.1 / 0.09290304).toFixed(4)} ft²`);
    expect(read("power", 38.28125, MOVING, "us")).toBe(`${(957.03125 / 745.6999).toFixed(4)} hp`);
    expect(read("pascals", 180, DUCT, "us")).toBe(`${(60 / 47.88026).toPrecision(3)} lbf/ft²`);
    expect(read("counts", 38.28125, MOVING, "us")).toBe("10.000 counts");
  });

  it("states what it is referred to: the size of a count and its area always", () => {
    const basis = (measure: Measure, of = MOVING) =>
      readingOf(measure, of, "si")?.basis?.replace(/[\u2009\u00a0]/g, " ");
    expect(basis("counts")).toBe("1 count = 0.001 on 10.00 m²");
    expect(basis("counts", { ...MOVING, countSize: 0.0001, referenceArea: 2.125 })).toBe(
      "1 count = 0.0001 on 2.125 m²",
    );
    expect(basis("coefficient")).toBe("on the reference area 10.00 m²");
    expect(basis("energy")).toBe("drag times speed, at 25.0 m/s, 1000 hours a year");
    expect(basis("pascals", DUCT)).toBe("on the flow area 3.00 m²");
    expect(readingOf("newtons", MOVING, "si")?.basis).toBeNull();
  });

  it("is offered where the product has what it needs, and says what is missing where not", () => {
    expect(measuresOffered(MOVING)).toEqual(["newtons", "drag-area", "coefficient", "counts", "power", "energy"]);
    expect(measuresOffered({ ...MOVING, referenceArea: null, hoursPerYear: null })).toEqual([
      "newtons",
      "drag-area",
      "power",
    ]);
    expect(measuresOffered({ ...MOVING, kind: "sign_panel" })).toEqual([
      "newtons",
      "drag-area",
      "coefficient",
      "counts",
    ]);
    expect(measuresOffered(DUCT)).toEqual(["newtons", "drag-area", "pascals"]);
    expect(readingOf("counts", DUCT, "si")).toBeNull();
    expect(missingMeasureSentence("counts", DUCT)).toMatch(/no reference area/);
    expect(missingMeasureSentence("pascals", MOVING)).toMatch(/Only a duct/);
    expect(missingMeasureSentence("energy", { ...MOVING, hoursPerYear: null })).toMatch(/no hours a year/);
  });
});

/** A repeatable draw (xorshift, G. Marsaglia 2003), so that a failure can be repeated. */
function drawn(seed: number): () => number {
  let state = seed;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 2 ** 32;
  };
}

describe("all measures of one force", () => {
  const next = drawn(20261201);
  const cases = Array.from({ length: 300 }, () => ({
    newtons: Math.round((next() - 0.3) * 10 ** (1 + 5 * next())) / 100,
    basis: measureBasis(
      next() < 0.5 ? "vehicle_fairing" : "duct",
      {
        countSize: next() < 0.5 ? 0.001 : 0.0001,
        referenceArea: { value: 0.2 + 30 * next() },
        flowArea: { value: 0.05 + 5 * next() },
      },
      { dynamicPressure: 5 + 2000 * next(), speed: 3 + 60 * next() },
      100 + 8000 * next(),
    ),
  }));
  const value = (text: string) => Number(text.replace(/\u2212/g, "-").replace(/[\s\u2009]/g, ""));

  it("agree: what is printed to fixed decimals leads back to the newtons, to 0.01 N", () => {
    for (const { newtons, basis } of cases) {
      for (const system of ["si", "us"] as const) {
        for (const measure of measuresOffered(basis)) {
          const reading = readingOf(measure, basis, system);
          if (!reading || reading.decimals === null) continue;
          const back = value(readNumber(reading, newtons)) / reading.perNewton;
          expect(toHundredths(back), `${measure} ${system} of ${newtons} N`).toBe(toHundredths(newtons));
        }
      }
    }
  });

  it("agree: newtons over q, over the area and over the size of a count are the counts; over the flow area the pascals", () => {
    for (const { newtons, basis } of cases) {
      const shown = (measure: Measure) => newtons * (readingOf(measure, basis, "si")?.perNewton ?? NaN);
      const dragArea = newtons / basis.dynamicPressure;
      const coefficient = dragArea / (basis.referenceArea ?? NaN);
      expect(shown("drag-area")).toBeCloseTo(dragArea, 9);
      expect(shown("coefficient")).toBeCloseTo(coefficient, 9);
      expect(shown("counts") * basis.countSize).toBeCloseTo(coefficient, 9);
      if (basis.kind === "duct") expect(shown("pascals") * (basis.flowArea ?? NaN)).toBeCloseTo(newtons, 6);
    }
  });

  it("never show a sign or a digit where newtons show 0.00, and always one where they show 0.01", () => {
    for (const { basis } of cases) {
      for (const measure of measuresOffered(basis)) {
        const reading = readingOf(measure, basis, "si");
        if (!reading) continue;
        expect(value(readNumber(reading, -0.004))).toBe(0);
        expect(readNumber(reading, -0.004)).not.toContain("\u2212");
        expect(readNumber(reading, 0.01)).toMatch(/[1-9]/);
      }
    }
  });
});

describe("printing", () => {
  it("keeps newtons as they were always printed", () => {
    expect(readText(NEWTONS, 61.594)).toBe("61.59\u2009N");
    expect(readNumber(NEWTONS, -0.004)).toBe("0.00");
    expect(readTick(NEWTONS, 50)).toBe("50");
  });

  it("parts thousands where there are five digits", () => {
    expect(read("power", 12345.6)).toBe("308 640.0 W");
  });
});
