import { describe, expect, it } from "vitest";
import { evaluateDocument } from "@/lib/evaluation/document/evaluate-document";
import { EvaluationDocument, type FluidInput, MethodInput } from "@/lib/evaluation/document/schema";
import { StreamPointInput } from "@/lib/evaluation/document/operating-point-schema";
import { contributionsOf, standardUncertaintyOf } from "@/lib/evaluation/methods/contributions";
import { evaluateMethod } from "@/lib/evaluation/methods/method-registry";
import { OWN_UNCERTAINTIES } from "@/lib/evaluation/methods/own-uncertainties";
import { streamStateOf } from "@/lib/evaluation/methods/stream-state";
import { expectRelative } from "@/tests/support/relative";
import { numberAt, readVectors, type VectorCase } from "@/tests/vectors/read-vectors";
import { answerOf, PLAIN, PLATE } from "./evaluate-one";

const LINES: Record<string, string> = {
  one_fifth_power: "one-fifth-law",
  one_seventh_power: "one-seventh-law",
  prandtl_schlichting: "prandtl-schlichting",
  schultz_grunow: "schultz-grunow",
  white_log: "white",
  ittc_1957: "ittc-1957",
  karman_schoenherr: "karman-schoenherr",
  laminar: "one-fifth-law",
};

/** Type A and B evaluation, Welch–Satterthwaite and whole budgets are the budget's; single items are compared here. */
const SINGLE = /^single_item/;

function uncertain(inputs: VectorCase["inputs"], key: string, relative: number | undefined) {
  const value = numberAt(inputs, key);
  return { value, standardUncertainty: value * (relative ?? 0) };
}

function contributionsTo({ inputs }: VectorCase) {
  const relative = inputs.relative_standard_uncertainty as Record<string, number>;
  const point: FluidInput = StreamPointInput.parse(
    "temperature_K" in inputs
      ? {
          fluid: "air",
          staticTemperature: uncertain(inputs, "temperature_K", relative.temperature),
          staticPressure: uncertain(inputs, "pressure_Pa", relative.pressure),
          speed: uncertain(inputs, "speed_m_s", relative.speed),
        }
      : {
          fluid: "custom",
          density: uncertain(inputs, "density_kg_m3", relative.density),
          dynamicViscosity: uncertain(inputs, "dynamic_viscosity_Pa_s", relative.dynamic_viscosity),
          speed: uncertain(inputs, "speed_m_s", relative.speed),
        },
  );
  const input = MethodInput.parse({
    method: "flat-plate-friction",
    length: uncertain(inputs, "length_m", relative.length),
    breadth: uncertain(inputs, "width_m", relative.width),
    faces: inputs.wetted_sides,
    frictionLine: LINES[String(inputs.method)],
    transition: inputs.method === "laminar" ? { kind: "laminar" } : { kind: "tripped", at: 0 },
  });
  const outcome = evaluateMethod(input.method, 1, input, streamStateOf(point));
  if (outcome.outcome === "refused") throw new Error("refused");
  const all = contributionsOf("x", 1, input, point, outcome.answer);
  // The vectors give the coefficient's own uncertainty; ours stands in a table.
  const given = [...all].filter(([source]) => !source.startsWith("own:"));
  const coefficient = (relative.coefficient ?? 0) * outcome.answer.drag;
  return { drag: outcome.answer.drag, contributions: new Map([...given, ["own:coefficient", coefficient] as const]) };
}

describe("first-order uncertainty against the reference vectors", () => {
  it.each(
    readVectors("uncertainty.json")
      .filter(({ kind }) => SINGLE.test(kind ?? ""))
      .map((vector) => [JSON.stringify(vector.inputs), vector] as const),
  )("%s", (_inputs, vector) => {
    const { drag, contributions } = contributionsTo(vector);
    expectRelative(drag, numberAt(vector.expected, "drag_N"), vector.tolerance_relative, "drag");
    expectRelative(
      standardUncertaintyOf(contributions),
      numberAt(vector.expected, "combined_standard_uncertainty_N"),
      vector.tolerance_relative,
      "combined",
    );
  });
});

describe("the answer's standard uncertainty", () => {
  it("is the line's own where every input is exact", () => {
    const { drag, standardUncertainty } = answerOf(PLAIN, PLATE);
    expectRelative(standardUncertainty, OWN_UNCERTAINTIES["prandtl-schlichting"].relative * drag, 1e-14);
  });

  it("adds an exact product's relative uncertainties in squares (GUM, eq. (12))", () => {
    const answer = answerOf(
      { ...PLAIN, speed: { value: 10, standardUncertainty: 0.1 } },
      {
        method: "bluff-body",
        dragCoefficient: { value: 1.2, standardUncertainty: 0.06 },
        referenceArea: { value: 0.5, standardUncertainty: 0.005 },
      },
    );
    const own = OWN_UNCERTAINTIES["bluff-body"].relative;
    expectRelative(answer.standardUncertainty, answer.drag * Math.hypot(2 * 0.01, 0.05, 0.01, own), 1e-10);
  });

  it("takes a run-up of 0 with its uncertainty for a finite effect", () => {
    const { standardUncertainty } = answerOf(PLAIN, { ...PLATE, runUp: { value: 0, standardUncertainty: 0.01 } });
    const exact = answerOf(PLAIN, PLATE).standardUncertainty ?? NaN;
    expect(standardUncertainty).toBeGreaterThan(exact);
    expect(standardUncertainty).toBeLessThan(2 * exact);
  });

  it("stays finite at the jump of the automatic choice and at the end of the admitted Re", () => {
    const edge = { value: 1e-4, standardUncertainty: 1e-6 }; // U k_s/ν = 100
    const atJump = answerOf(PLAIN, { ...PLATE, length: 0.4, roughness: edge });
    expect(atJump.standardUncertainty).toBeLessThan(atJump.drag);
    const last = answerOf(PLAIN, { ...PLATE, length: { value: 1e4, standardUncertainty: 1 }, frictionLine: "white" });
    expect(last.standardUncertainty).toBeGreaterThan(0);
    expect(last.standardUncertainty).toBeLessThan(0.2 * last.drag);
  });

  it("adds what members of a share have in common linearly", () => {
    const body = { method: "bluff-body", dragCoefficient: 1, referenceArea: 1 };
    const document = EvaluationDocument.parse({
      operatingPoints: [{ id: "p", ...PLAIN, speed: { value: 10, standardUncertainty: 1 } }],
      items: [
        { id: "a", ...body },
        { id: "b", ...body },
        { id: "s", method: "share", fraction: { value: 0.1, standardUncertainty: 0.02 }, of: ["a", "b"] },
      ],
    });
    const share = evaluateDocument(document).operatingPoints[0]?.items[2];
    if (!share || "refused" in share) throw new Error("refused");
    // Two bodies of 50 N: the speed moves both by 20 %, their shape coefficients' bias is one; the fraction adds 2 N.
    const speed = 0.1 * 100 * 0.2;
    const shape = 0.1 * 100 * OWN_UNCERTAINTIES["bluff-body"].relative;
    const own = 10 * OWN_UNCERTAINTIES.share.relative;
    expectRelative(share.standardUncertainty, Math.hypot(speed, shape, 100 * 0.02, own), 1e-9);
  });

  it("names a source for every line and method", () => {
    for (const [name, { relative, source }] of Object.entries(OWN_UNCERTAINTIES)) {
      expect(relative, name).toBeGreaterThanOrEqual(0);
      expect(source.length, name).toBeGreaterThan(5);
    }
  });
});
