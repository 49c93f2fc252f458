import { describe, expect, it } from "vitest";
import { frictionLayer } from "@/lib/aero/friction/friction-layer";
import type { FrictionLineName } from "@/lib/aero/friction/friction-line-name";
import { FRICTION_LINES } from "@/lib/aero/friction/friction-lines";
import { integrate } from "@/tests/support/integrate";
import { expectRelative } from "@/tests/support/relative";

/**
 * Each line beside an independent one over its range, with the greatest distance that the literature lets expect: power
 * laws and logarithmic lines within 6 %, White 9 % high at Re 1e10, ITTC-1957 high below Re 1e6, Schultz-Grunow low towards 1e9, the rough pair 8 to 29 %.
 */
const BESIDE: [FrictionLineName, FrictionLineName, number, number, number, number][] = [
  ["one-fifth-law", "karman-schoenherr", 5e5, 1e7, -0.01, 0.09],
  ["one-seventh-law", "white", 5e5, 1e9, -0.05, 0.06],
  ["prandtl-schlichting", "karman-schoenherr", 5e5, 1e9, 0.0, 0.03],
  ["schultz-grunow", "white", 1e6, 1e9, -0.11, 0.05],
  ["white", "karman-schoenherr", 5e5, 1e10, -0.04, 0.1],
  ["karman-schoenherr", "momentum-integral", 1e6, 1e10, -0.04, 0.04],
  ["ittc-1957", "karman-schoenherr", 1e6, 1e10, -0.01, 0.07],
  ["momentum-integral", "white", 1e6, 1e9, -0.04, 0.0],
];

const sweep = (min: number, max: number): number[] =>
  Array.from({ length: 60 }, (_, index) => min * (max / min) ** (index / 59));

describe("each friction line over its stated range", () => {
  it.each(BESIDE)("%s lies by %s (Re %f to %f, within %f to %f)", (name, other, min, max, low, high) => {
    const [line, beside] = [FRICTION_LINES[name].turbulentLayer(0), FRICTION_LINES[other].turbulentLayer(0)];
    for (const re of sweep(min, max)) {
      const distance = line.frictionIntegral(re) / beside.frictionIntegral(re) - 1;
      expect(distance, `Re ${re}`).toBeGreaterThan(low);
      expect(distance, `Re ${re}`).toBeLessThan(high);
    }
  });

  it("the two fully rough lines differ by 7 to 23 %, Mills & Hang the lower one (their x/k_s 200 to 1e6)", () => {
    for (const ratio of sweep(200, 1e6)) {
      const rough = FRICTION_LINES["fully-rough"].turbulentLayer(100).frictionIntegral(100 * ratio);
      const lower = FRICTION_LINES["fully-rough-mills-hang"].turbulentLayer(100).frictionIntegral(100 * ratio);
      expect(1 - lower / rough, `x/k_s ${ratio}`).toBeGreaterThan(0.07);
      expect(1 - lower / rough, `x/k_s ${ratio}`).toBeLessThan(0.23);
    }
  });

  it("the momentum integral in its fully rough limit meets Mills & Hang within 0.7 % (x/k_s 200 to 1e6)", () => {
    for (const ratio of sweep(200, 1e6)) {
      const roughness = 1e7; // k_s⁺ of some 1e5: viscosity has dropped out
      const integral = FRICTION_LINES["momentum-integral"]
        .turbulentLayer(roughness)
        .frictionIntegral(roughness * ratio);
      const published = FRICTION_LINES["fully-rough-mills-hang"]
        .turbulentLayer(roughness)
        .frictionIntegral(roughness * ratio);
      expectRelative(integral, published, 7e-3, `x/k_s ${ratio}`);
    }
  });

  it.each(Object.values(FRICTION_LINES).map((line) => [line.name, line] as const))(
    "%s: C_F is positive and falls, and the local coefficient is the slope of F",
    (_name, line) => {
      const roughness = line.surface === "smooth" ? 0 : 120;
      const layer = line.turbulentLayer(roughness);
      const { min, max } = line.reynoldsRange;
      let last = Infinity;
      for (const re of sweep(min, max)) {
        const mean = layer.frictionIntegral(re) / re;
        expect(mean).toBeGreaterThan(0);
        expect(mean).toBeLessThanOrEqual(last * (1 + 1e-14));
        last = mean;
      }
      // F over two decades by integrating the local coefficient in ln Re, another route to the same number.
      const start = Math.max(min, 2e5);
      const [difference = NaN] = integrate(
        (log) => [layer.localCoefficient(Math.exp(log)) * Math.exp(log)],
        Math.log(start),
        [0],
        Math.log(100 * start),
      );
      expectRelative(difference, layer.frictionIntegral(100 * start) - layer.frictionIntegral(start), 1e-9);
    },
  );

  it.each(Object.values(FRICTION_LINES).map((line) => [line.name, line] as const))(
    "%s: past transition the local coefficient is the slope of F",
    (_name, line) => {
      const layer = frictionLayer(line, line.surface === "smooth" ? 0 : 120, { kind: "at", reynolds: 5e5 });
      for (const re of [1e5, 4.9e5, 5.1e5, 3e6, 1e8]) {
        const h = 1e-4 * re;
        const slope = (layer.frictionIntegral(re + h) - layer.frictionIntegral(re - h)) / (2 * h);
        expectRelative(layer.localCoefficient(re), slope, 1e-7, `Re ${re}`);
      }
    },
  );
});
