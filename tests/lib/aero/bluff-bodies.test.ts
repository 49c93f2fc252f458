import { describe, expect, it } from "vitest";
import { BLUFF_BODY_SHAPES } from "@/lib/aero/bluff-body-shapes";
import {
  cylinderDragCoefficient,
  schillerNaumannDragCoefficient,
  SCHILLER_NAUMANN_RANGE,
  sphereDragCoefficient,
} from "@/lib/aero/low-reynolds-drag";
import { answerOf } from "@/tests/lib/evaluation/methods/evaluate-one";
import { expectRelative } from "@/tests/support/relative";
import { numberAt, readVectors } from "@/tests/vectors/read-vectors";

const cases = readVectors("bluff-bodies.json");

describe("the catalogue of bluff bodies against the reference vectors", () => {
  const tables = cases.filter(({ kind }) => kind === "table_value");

  it("holds every table value, in order, with its coefficient, area and source", () => {
    expect(BLUFF_BODY_SHAPES).toHaveLength(tables.length);
    tables.forEach(({ inputs, expected, table, tolerance_relative }, index) => {
      const shape = BLUFF_BODY_SHAPES[index];
      expect(shape?.id.startsWith(String(inputs.shape).replaceAll("_", "-")), shape?.id).toBe(true);
      expect(shape?.dragCoefficient).toBe(expected.drag_coefficient);
      expect(shape?.referenceArea).toBe(inputs.reference_area);
      expect(shape?.spread).toBe(tolerance_relative);
      const words = String(table).split(/[ ,]/)[0] ?? "";
      expect(shape?.source.startsWith(words), shape?.source).toBe(true);
    });
  });

  it("says of each value whether it is from memory, as the vectors do", () => {
    expect(BLUFF_BODY_SHAPES.map(({ isFromMemory }) => isFromMemory)).toEqual(
      tables.map(({ flag }) => flag === "from memory"),
    );
  });

  it("names every shape of a source once", () => {
    expect(new Set(BLUFF_BODY_SHAPES.map(({ id, source }) => id + source)).size).toBe(BLUFF_BODY_SHAPES.length);
  });
});

describe("bluff bodies by formula", () => {
  it.each(cases.filter(({ kind }) => kind === "formula").map((vector) => [vector.inputs.Re_diameter, vector] as const))(
    "curve fits at Re %d",
    (_re, { inputs, expected, tolerance_relative }) => {
      const re = numberAt(inputs, "Re_diameter");
      expectRelative(sphereDragCoefficient(re), numberAt(expected, "sphere_white_curve_fit"), tolerance_relative);
      expectRelative(cylinderDragCoefficient(re), numberAt(expected, "cylinder_white_curve_fit"), tolerance_relative);
      expect("sphere_schiller_naumann" in expected).toBe(re <= SCHILLER_NAUMANN_RANGE.max);
      if (re <= SCHILLER_NAUMANN_RANGE.max) {
        expectRelative(
          schillerNaumannDragCoefficient(re),
          numberAt(expected, "sphere_schiller_naumann"),
          tolerance_relative,
        );
      }
    },
  );

  it.each(
    cases
      .filter(({ kind }) => kind === "drag_from_coefficient")
      .map((vector) => [vector.inputs.shape, vector] as const),
  )("drag of %s", (_shape, { inputs, expected, tolerance_relative }) => {
    const { drag } = answerOf(
      { fluid: "custom", density: inputs.density_kg_m3, dynamicViscosity: 1.8e-5, speed: inputs.speed_m_s },
      { method: "bluff-body", dragCoefficient: inputs.drag_coefficient, referenceArea: inputs.frontal_area_m2 },
    );
    expectRelative(drag, numberAt(expected, "drag_N"), tolerance_relative);
  });
});
