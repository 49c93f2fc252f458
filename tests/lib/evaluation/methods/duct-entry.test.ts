import { describe, expect, it } from "vitest";
import { colebrookFriction, developedDuctDrag } from "@/lib/aero/colebrook";
import { ductBlockage, hydraulicDiameter } from "@/lib/aero/duct-blockage";
import { expectRelative } from "@/tests/support/relative";
import { numberAt, readVectors, type VectorCase } from "@/tests/vectors/read-vectors";
import { answerOf, noteCodes, PLAIN, refusalOf } from "./evaluate-one";

type Nested = Record<string, Record<string, unknown>>;

function answerTo({ inputs }: VectorCase) {
  const isLaminar = inputs.regime === "laminar";
  return answerOf(
    {
      fluid: "custom",
      density: inputs.density_kg_m3,
      dynamicViscosity: inputs.dynamic_viscosity_Pa_s,
      speed: inputs.entry_speed_m_s,
    },
    {
      method: "duct-entry",
      width: inputs.width_m,
      height: inputs.height_m,
      length: inputs.length_m,
      roughness: inputs.wall_roughness_m,
      transition: isLaminar ? { kind: "laminar" } : { kind: "tripped", at: 0 },
      frictionLine: "one-fifth-law",
    },
  );
}

/**
 * Compared: single pass with the consistent δ* (0.037·9/7), plates, Colebrook. Of another convention: δ* = 0.048, iterated
 * and marched cores, half-angles, Haaland, laminar developed flow; pressure drop there is that of the accelerated core.
 */
describe("duct entries against the reference vectors", () => {
  it.each(readVectors("duct-entry.json").map((vector) => [JSON.stringify(vector.inputs), vector] as const))(
    "%s",
    (_inputs, vector) => {
      const { inputs, expected, tolerance_relative: tolerance } = vector;
      const answer = answerTo(vector);
      const nested = expected as Nested;
      const single = nested[inputs.regime === "laminar" ? "laminar" : "turbulent_one_fifth_consistent"] ?? {};
      expectRelative(answer.reynolds, numberAt(expected, "Re_L"), tolerance, "Re");
      expectRelative(answer.meanCoefficient, numberAt(expected, "CF_plate"), tolerance, "C_F");
      expectRelative(answer.drag, numberAt(expected, "wall_drag_flat_plate_N"), tolerance, "drag");
      const pairs = {
        displacementThickness: "delta_star_single_pass_m",
        coreSpeedAtExit: "core_velocity_single_pass_m_s",
        blockedAreaFraction: "blocked_area_fraction",
        exitWidthForConstantCore: "exit_width_for_constant_core_m",
        exitHeightForConstantCore: "exit_height_for_constant_core_m",
      } as const;
      for (const [ours, theirs] of Object.entries(pairs)) {
        expectRelative(answer[ours as keyof typeof pairs], numberAt(single, theirs), tolerance, ours);
      }
      const area = numberAt(inputs, "width_m") * numberAt(inputs, "height_m");
      expectRelative(answer.pressureLoss, numberAt(expected, "wall_drag_flat_plate_N") / area, tolerance, "Δp");
      expect(answer.notes.some(({ code }) => code === "layers-meet-in-duct")).toBe(expected.layers_merge);
    },
  );

  it.each(readVectors("duct-entry.json").map((vector) => [JSON.stringify(vector.inputs), vector] as const))(
    "developed flow %s",
    (_inputs, { inputs, expected, tolerance_relative: tolerance }) => {
      const developed = (expected as Nested).fully_developed ?? {};
      if (developed.turbulent_applicable !== true) return expect(numberAt(expected, "Re_Dh")).toBeLessThan(4000);
      const [width, height] = [numberAt(inputs, "width_m"), numberAt(inputs, "height_m")];
      const diameter = hydraulicDiameter(width, height);
      expectRelative(diameter, numberAt(expected, "hydraulic_diameter_m"), tolerance);
      const speed = numberAt(inputs, "entry_speed_m_s");
      const density = numberAt(inputs, "density_kg_m3");
      const factor = colebrookFriction(
        (density * speed * diameter) / numberAt(inputs, "dynamic_viscosity_Pa_s"),
        numberAt(inputs, "wall_roughness_m") / diameter,
      );
      expectRelative(factor, numberAt(developed, "darcy_f_colebrook"), tolerance);
      expectRelative(
        developedDuctDrag(factor, numberAt(inputs, "length_m") / diameter, 0.5 * density * speed ** 2, width * height),
        numberAt(developed, "wall_drag_colebrook_N"),
        tolerance,
      );
    },
  );
});

const DUCT = { method: "duct-entry", width: 0.5, height: 0.3, length: 1, frictionLine: "one-fifth-law" };

describe("a duct entry", () => {
  it("keeps the volume flow: open area times core speed is width times height times entry speed", () => {
    const answer = answerOf(PLAIN, DUCT);
    const open = (0.5 - 2 * (answer.displacementThickness ?? NaN)) * (0.3 - 2 * (answer.displacementThickness ?? NaN));
    expectRelative(open * (answer.coreSpeedAtExit ?? NaN), 0.5 * 0.3 * 10, 1e-13);
  });

  it("is refused where the displacement of two walls fills the shorter side", () => {
    expect(refusalOf(PLAIN, { ...DUCT, height: 0.002 })).toMatch(/^The layers block the duct/);
    expect(() => ductBlockage(1, 0.1, 0.05, 10)).toThrow(RangeError);
  });

  it("says how much it reads low at the exit, and tells of layers that meet and of developed flow", () => {
    expect(noteCodes(PLAIN, DUCT)).toContain("duct-friction-reads-low");
    expect(noteCodes(PLAIN, DUCT)).not.toContain("layers-meet-in-duct");
    expect(noteCodes(PLAIN, DUCT)).not.toContain("fully-developed-cross-check");
    const narrow = noteCodes(PLAIN, { ...DUCT, height: 0.03 });
    expect(narrow).toContain("layers-meet-in-duct");
    expect(narrow).toContain("fully-developed-cross-check");
  });

  it("takes no field of a plate: it runs at the entry speed", () => {
    expect(() => answerOf(PLAIN, { ...DUCT, localSpeedRatio: 1.1 })).toThrow(
      "items[0].localSpeedRatio: is not a field here",
    );
  });
});
