import { describe, expect, it } from "vitest";
import {
  BLASIUS_SHAPE_FACTOR,
  BLASIUS_THICKNESS_RATIO,
  blasiusFrictionIntegral,
  blasiusLocalCoefficient,
} from "@/lib/aero/friction/blasius";
import { integrate } from "@/tests/support/integrate";
import { expectRelative } from "@/tests/support/relative";
import { numberAt, readVectors } from "@/tests/vectors/read-vectors";

/** f''' + ½ f f'' = 0, f(0) = f'(0) = 0; with the two thickness integrals as fourth and fifth unknown. */
function march(wallShear: number, to: number): number[] {
  return integrate(
    (_eta, [f = 0, u = 0, shear = 0]) => [u, shear, -0.5 * f * shear, 1 - u, u * (1 - u)],
    0,
    [0, 0, wallShear, 0, 0],
    to,
  );
}

/** Wall shear of the solution with f' → 1, by the scaling of the equation: a trial of shear 1 ends at some f'∞. */
function wallShear(): number {
  const [, atInfinity = NaN] = march(1, 12);
  return atInfinity ** -1.5;
}

describe("Blasius, re-integrated", () => {
  const shear = wallShear();
  const [, , , displacement = NaN, momentum = NaN] = march(shear, 12);

  it("has the wall shear 0.332057 of Howarth's table", () => {
    expectRelative(shear, 0.3320573362152, 1e-8);
  });

  it("gives the rounded constants that the line uses, within their rounding", () => {
    expectRelative(blasiusFrictionIntegral(1), 4 * shear, 2e-4); // 1.328 for 1.32823
    expectRelative(blasiusLocalCoefficient(1), 2 * shear, 2e-4);
    expectRelative(BLASIUS_SHAPE_FACTOR, displacement / momentum, 2e-4); // 1.7208/0.664 for 2.5911
  });

  it("reaches 0.9916 of the stream at the edge that the thickness 5.0 means", () => {
    const [, u = NaN] = march(shear, BLASIUS_THICKNESS_RATIO * 0.664);
    expect(u).toBeCloseTo(0.9916, 3);
  });

  const cases = readVectors("blasius.json");
  it("agrees with the constants of the reference vectors", () => {
    const constants = cases.find(({ kind }) => kind === "constants")?.expected ?? {};
    expectRelative(shear, numberAt(constants, "fpp0"), 1e-8);
    expectRelative(displacement, numberAt(constants, "displacement_integral"), 1e-8);
    expectRelative(momentum, numberAt(constants, "momentum_integral"), 1e-8);
    expectRelative(displacement / momentum, numberAt(constants, "shape_factor_H12"), 1e-8);
    expectRelative(blasiusFrictionIntegral(1), numberAt(constants, "mean_coefficient_CF_times_sqrt_ReL"), 2e-4);
  });

  it.each(
    cases
      .filter(({ kind, inputs }) => kind === "profile" && inputs.eta !== 0)
      .map((vector) => [vector.inputs.eta, vector] as const),
  )("agrees with the profile at η = %d", (_eta, { inputs, expected }) => {
    const [f, u, curvature] = march(shear, numberAt(inputs, "eta"));
    expectRelative(f, numberAt(expected, "f"), 1e-7, "f");
    expectRelative(u, numberAt(expected, "u_over_U"), 1e-7, "u/U");
    expect(Math.abs((curvature ?? NaN) - numberAt(expected, "fpp"))).toBeLessThan(1e-8);
  });
});
