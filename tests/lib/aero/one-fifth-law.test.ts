import { describe, expect, it } from "vitest";
import { FRICTION_LINES, FRICTION_LINES_BY_INTEGRAL } from "@/lib/aero/friction/friction-lines";
import { oneFifthLocalByIntegral, oneFifthMeanByIntegral } from "@/lib/aero/friction/one-fifth-law";
import { layerThickness } from "@/lib/aero/layer-thickness";
import { expectRelative } from "@/tests/support/relative";
import { numberAt, readVectors } from "@/tests/vectors/read-vectors";

const cases = readVectors("friction-lines.json").filter(({ inputs }) => inputs.method === "one_fifth_power");

describe("the one-fifth law with the constants of the momentum integral", () => {
  it.each(cases.map((vector) => [numberAt(vector.inputs, "Re"), vector] as const))(
    "gives the reference's mean and local coefficient at Re %d",
    (reynolds, { expected }) => {
      expectRelative(oneFifthMeanByIntegral(reynolds), numberAt(expected, "mean_CF_0p072_momentum_integral"), 1e-10);
      expectRelative(oneFifthLocalByIntegral(reynolds), numberAt(expected, "local_cf_0p0576_momentum_integral"), 1e-10);
    },
  );

  it("belongs to one printed set: θ/x 0.036, δ*/x 0.0463 and δ/x 0.371, each times Re^(−1/5)", () => {
    const reynolds = 2e6;
    const theta = oneFifthMeanByIntegral(reynolds) / 2;
    const { thickness, displacementThickness } = layerThickness("one-fifth-law", theta, reynolds, theta * reynolds, 0);
    const times = reynolds ** 0.2;
    expect(theta * times).toBeCloseTo(0.036, 3);
    expect(displacementThickness * times).toBeCloseTo(0.0463, 4);
    // The profile's exact δ = 72/7 θ gives 0.3703; books round the set's own 0.3707 to 0.371.
    expect(thickness * times).toBeCloseTo(0.37, 2);
  });

  it("crosses Blasius once, where 0.072 Re^(−1/5) is 1.328/√Re, and rises everywhere over its range", () => {
    const layer = FRICTION_LINES_BY_INTEGRAL["one-fifth-law"].turbulentLayer(0);
    // Re^0.3 = 1.328/0.072.
    expectRelative(layer.blasiusBelow, (1.328 / 0.072) ** (1 / 0.3), 1e-9);
    let before = 0;
    for (let power = 3; power <= 9; power += 0.1) {
      const now = layer.frictionIntegral(10 ** power);
      expect(now).toBeGreaterThan(before);
      before = now;
    }
  });

  it("takes the place of that one line and leaves every other the very same", () => {
    const changed = Object.entries(FRICTION_LINES_BY_INTEGRAL).filter(
      ([name, line]) => line !== Object.entries(FRICTION_LINES).find(([known]) => known === name)?.[1],
    );
    expect(changed.map(([name]) => name)).toEqual(["one-fifth-law"]);
  });
});
