import { describe, expect, it } from "vitest";
import { admissibleRoughness } from "@/lib/aero/admissible-roughness";
import { automaticLayer } from "@/lib/aero/friction/automatic-layer";
import { fullyRoughLocal, fullyRoughMean } from "@/lib/aero/friction/fully-rough";
import { millsHangLocal, millsHangMean } from "@/lib/aero/friction/fully-rough-mills-hang";
import { FRICTION_LINES } from "@/lib/aero/friction/friction-lines";
import { roughnessVerdict } from "@/lib/aero/roughness-verdict";
import { expectRelative } from "@/tests/support/relative";
import { numberAt, readVectors, type VectorCase } from "@/tests/vectors/read-vectors";

type Values = Record<string, number | string>;

function correlation({ inputs }: VectorCase): Values {
  const ratio = numberAt(inputs, "L_over_k");
  return {
    schlichting_mean_CF: fullyRoughMean(ratio),
    schlichting_local_cf_derived_from_mean: fullyRoughLocal(ratio),
    mills_hang_mean_CF: millsHangMean(ratio),
    mills_hang_local_cf_derived_from_mean: millsHangLocal(ratio),
  };
}

function admissible({ inputs }: VectorCase): Values {
  const [speed, viscosity] = [numberAt(inputs, "speed_m_s"), numberAt(inputs, "kinematic_viscosity_m2_s")];
  return { k_admissible_m: admissibleRoughness(speed, viscosity) };
}

function greater({ inputs }: VectorCase): Values {
  const { reynolds, roughnessReynolds, k_admissible_m } = numbersOf(inputs, "L_m");
  const smooth = FRICTION_LINES["prandtl-schlichting"].turbulentLayer(0).frictionIntegral(reynolds) / reynolds;
  const rough = fullyRoughMean(reynolds / roughnessReynolds);
  const layer = automaticLayer(roughnessReynolds, { kind: "from-start" });
  return {
    Re_L: reynolds,
    L_over_k: reynolds / roughnessReynolds,
    CF_smooth: smooth,
    CF_fully_rough: rough,
    CF_used: layer.frictionIntegral(reynolds) / reynolds,
    governs: layer.lineAt(reynolds) === "fully-rough" ? "rough" : "smooth",
    k_admissible_m,
  };
}

function numbersOf(inputs: VectorCase["inputs"], length: string) {
  const [speed, viscosity] = [numberAt(inputs, "speed_m_s"), numberAt(inputs, "kinematic_viscosity_m2_s")];
  return {
    reynolds: (speed * numberAt(inputs, length)) / viscosity,
    roughnessReynolds: (speed * numberAt(inputs, "k_m")) / viscosity,
    k_admissible_m: admissibleRoughness(speed, viscosity),
  };
}

/** The vectors judge by k⁺ with a smooth local coefficient and limits 5 and 70; ours by 100 ν/U and the answer's own. */
const REGIME_OF_OURS: Record<string, string> = { smooth: "smooth", transitional: "between", fully_rough: "rough" };

const OTHER_CONVENTIONS: Record<string, string> = {
  schlichting_local_cf: "printed local fit; ours is dF/dx",
  white_rough_local_cf: "a third rough line",
  mills_hang_local_cf: "printed local fit; ours is dF/dx",
};

describe("rough plates against the reference vectors", () => {
  const cases = readVectors("rough-plate.json");
  const computed: Record<string, (vector: VectorCase) => Values> = {
    correlation,
    admissible_roughness: admissible,
    greater_of_smooth_and_rough: greater,
  };

  it.each(
    cases
      .filter(({ inputs }) => inputs.kind !== "regime")
      .map((vector) => [JSON.stringify(vector.inputs), vector] as const),
  )("%s", (_inputs, vector) => {
    const values = computed[String(vector.inputs.kind)]?.(vector) ?? {};
    for (const [key, expected] of Object.entries(vector.expected)) {
      if (key in OTHER_CONVENTIONS) continue;
      if (typeof expected === "number") expectRelative(Number(values[key]), expected, vector.tolerance_relative, key);
      else expect(values[key], key).toBe(expected);
    }
  });

  it.each(
    cases
      .filter(({ inputs }) => inputs.kind === "regime")
      .map((vector) => [JSON.stringify(vector.inputs), vector] as const),
  )("verdict %s", (_inputs, { inputs, expected }) => {
    const { reynolds, roughnessReynolds, k_admissible_m } = numbersOf(inputs, "x_m");
    expectRelative(reynolds, numberAt(expected, "Re_x"), 1e-9);
    const kPlus = numberAt(expected, "k_plus_with_greater_cf");
    const cf = Math.max(numberAt(expected, "cf_smooth_white"), numberAt(expected, "cf_rough_schlichting"));
    expectRelative(roughnessReynolds * Math.sqrt(cf / 2), kPlus, 1e-9);
    const isSmoothEnough = numberAt(inputs, "k_m") <= k_admissible_m;
    expect(roughnessVerdict(isSmoothEnough, kPlus)).toBe(REGIME_OF_OURS[String(expected.regime_with_greater_cf)]);
  });
});

describe("a fully rough line", () => {
  it.each(["fully-rough", "fully-rough-mills-hang"] as const)("%s keeps its coefficient below x/k_s = 100", (name) => {
    const layer = FRICTION_LINES[name].turbulentLayer(50);
    const held = layer.frictionIntegral(5000) / 5000;
    expectRelative(layer.frictionIntegral(100) / 100, held, 1e-14);
    expectRelative(layer.localCoefficient(4999), held, 1e-14);
    expect(layer.frictionIntegral(6000) / 6000).toBeLessThan(held);
    expectRelative(layer.frictionIntegral(5000 * (1 + 1e-9)), layer.frictionIntegral(5000), 2e-9);
  });

  it("refuses a surface without roughness", () => {
    expect(() => FRICTION_LINES["fully-rough"].turbulentLayer(0)).toThrow(RangeError);
  });
});
