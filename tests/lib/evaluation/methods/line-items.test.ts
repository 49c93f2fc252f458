import { describe, expect, it } from "vitest";
import { expectRelative } from "@/tests/support/relative";
import { numberAt, readVectors, type VectorCase } from "@/tests/vectors/read-vectors";
import { answerOf } from "./evaluate-one";

const LINES: Record<string, string> = {
  one_fifth_power: "one-fifth-law",
  prandtl_schlichting: "prandtl-schlichting",
  ittc_1957: "ittc-1957",
  karman_schoenherr: "karman-schoenherr",
};

function transitionOf({ inputs }: VectorCase): object {
  switch (inputs.transition_mode) {
    case "laminar":
      return { kind: "laminar" };
    case "transition_at_Re_crit":
      return { kind: "natural", criticalReynolds: inputs.Re_crit };
    case "tripped_at_x":
      return { kind: "tripped", at: inputs.trip_position_m };
    default:
      return { kind: "tripped", at: 0 };
  }
}

function answerTo(vector: VectorCase) {
  const { inputs } = vector;
  const { temperature_K: staticTemperature, pressure_Pa: staticPressure, speed_m_s: speed } = inputs;
  const point =
    inputs.fluid === "dry_air"
      ? { fluid: "air", staticTemperature, staticPressure, speed }
      : { fluid: "fresh-water", staticTemperature, speed };
  const isGreater = inputs.roughness_rule === "greater_of_smooth_and_fully_rough";
  return answerOf(point, {
    method: "flat-plate-friction",
    length: inputs.length_m,
    breadth: inputs.width_m,
    faces: inputs.wetted_sides,
    roughness: inputs.roughness_m,
    transition: transitionOf(vector),
    frictionLine: isGreater ? "automatic" : LINES[String(inputs.method)],
  });
}

/** The momentum integral with c = 0.3 is another convention; it is compared in the wall-and-wake vectors. */
const isOurs = ({ inputs }: VectorCase): boolean => inputs.roughness_rule !== "coles_momentum_integral_rough_0p3";

describe("whole line items against the reference vectors", () => {
  const cases = readVectors("line-items.json");

  it("compares all but the one of another convention", () => {
    expect(cases.filter(isOurs)).toHaveLength(cases.length - 1);
  });

  it.each(cases.filter(isOurs).map((vector) => [JSON.stringify(vector.inputs), vector] as const))(
    "%s",
    (_in, vector) => {
      const { expected, tolerance_relative: tolerance } = vector;
      const answer = answerTo(vector);
      expectRelative(answer.drag, numberAt(expected, "drag_N"), tolerance, "drag");
      expectRelative(answer.reynolds, numberAt(expected, "Re_L"), tolerance, "Re");
      expectRelative(answer.meanCoefficient, numberAt(expected, "mean_CF"), tolerance, "C_F");
      if ("transition_position_m" in expected) {
        expectRelative(answer.transitionAt, numberAt(expected, "transition_position_m"), tolerance, "transition");
      }
      if ("k_admissible_m" in expected) {
        expectRelative(answer.admissibleRoughness, numberAt(expected, "k_admissible_m"), tolerance, "k_adm");
        expect(answer.frictionLineUsed).toBe("fully-rough");
      }
    },
  );
});
