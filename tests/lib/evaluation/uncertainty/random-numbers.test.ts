import { describe, expect, it } from "vitest";
import { normalBeyond, normalCumulative } from "@/lib/evaluation/uncertainty/normal-distribution";
import { normalQuantile } from "@/lib/evaluation/uncertainty/normal-quantile";
import { seededStream, splitMix, xoshiro } from "@/lib/evaluation/uncertainty/xoshiro";

describe("the generator", () => {
  it("gives the words of the reference implementation xoshiro128starstar.c 1.1 from the state 1, 2, 3, 4", () => {
    const stream = xoshiro([1, 2, 3, 4]);
    expect(Array.from({ length: 10 }, () => stream.nextWord())).toEqual([
      11520, 0, 5927040, 70819200, 2031721883, 1637235492, 1287239034, 3734860849, 3729100597, 4258142804,
    ]);
  });

  it("makes its state by SplitMix64, whose reference implementation gives these for the seed 1234567", () => {
    expect(splitMix(1234567n)).toEqual({ first: 6457827717110365317n, second: 3203168211198807973n });
  });

  it("stays inside the open interval from 0 to 1, with the moments of a uniform distribution", () => {
    const stream = seededStream(7);
    const numbers = Array.from({ length: 100_000 }, () => stream.nextUniform());
    expect(numbers.every((each) => each > 0 && each < 1)).toBe(true);
    const mean = numbers.reduce((sum, each) => sum + each, 0) / numbers.length;
    const variance = numbers.reduce((sum, each) => sum + (each - mean) ** 2, 0) / numbers.length;
    // Five standard errors: 1/√(12 n) of the mean, 1/√(180 n) of the variance.
    expect(Math.abs(mean - 0.5)).toBeLessThan(5 / Math.sqrt(12e5));
    expect(Math.abs(variance - 1 / 12)).toBeLessThan(5 / Math.sqrt(180e5));
  });

  it("gives a number above 0 where both words are 0", () => {
    expect(xoshiro([0, 0, 0, 1]).nextUniform()).toBe(2 ** -53);
  });

  it("refuses a seed that is no whole number from 0", () => {
    for (const seed of [-1, 0.5, Number.NaN, 2 ** 53]) expect(() => seededStream(seed)).toThrow(RangeError);
  });
});

describe("the normal distribution", () => {
  it.each([
    // Abramowitz & Stegun, table 26.1.
    [0, 0.5],
    [1, 0.841344746068543],
    [1.96, 0.97500210485178],
    [2, 0.977249868051821],
    [3, 0.99865010196837],
    [-2.5, 0.006209665325776],
  ])("lies below %s with the tabled part", (x, part) => {
    expect(Math.abs(normalCumulative(x) - part)).toBeLessThan(1e-14);
  });

  it("keeps its digits far out", () => {
    // Table 26.2 of Abramowitz & Stegun: −log₁₀(1 − Φ(x)).
    for (const [x, logarithm] of [
      [5, 6.54265],
      [10, 23.11805],
      [20, 88.5601],
    ] as const) {
      expect(Math.abs(-Math.log10(normalBeyond(x)) - logarithm)).toBeLessThan(1e-5);
    }
  });

  it("is reached by its quantile over the whole range", () => {
    for (let x = -8; x <= 5; x += 0.05) expect(Math.abs(normalQuantile(normalCumulative(x)) - x)).toBeLessThan(1e-9);
    for (let x = -37; x <= -8; x += 0.5) {
      expect(Math.abs(normalQuantile(normalCumulative(x)) / x - 1)).toBeLessThan(1e-13);
    }
  });

  it("has the check values that Wichura prints with AS 241", () => {
    expect(normalQuantile(0.25)).toBeCloseTo(-0.6744897501960817, 15);
    expect(normalQuantile(0.001)).toBeCloseTo(-3.090232306167814, 14);
    expect(normalQuantile(1e-20)).toBeCloseTo(-9.262340089798408, 14);
  });
});
