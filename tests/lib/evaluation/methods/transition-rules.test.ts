import { describe, expect, it } from "vitest";
import { blasiusFrictionIntegral } from "@/lib/aero/friction/blasius";
import { expectRelative } from "@/tests/support/relative";
import { answerOf, noteCodes, PLAIN, refusalOf } from "./evaluate-one";

/** In `PLAIN`, Re is 1e6 times a length and q is 50 Pa. */
const plate = (fields: object) => ({ method: "flat-plate-friction", length: 2, breadth: 1, faces: 1, ...fields });
const natural = (criticalReynolds: number) => ({ kind: "natural", criticalReynolds });
const tripped = (at: number) => ({ kind: "tripped", at });
const answer = (fields: object) => answerOf(PLAIN, plate(fields));

describe("where the layer turns turbulent", () => {
  it("gives the place asked for, from the start of the layer", () => {
    expectRelative(answer({}).transitionAt, 0.5, 1e-14);
    expect(answer({ transition: tripped(0.3) }).transitionAt).toBe(0.3);
    expect(answer({ transition: tripped(0.3), runUp: 1 }).transitionAt).toBe(0.3);
    expect(answer({ transition: tripped(0) }).transitionAt).toBe(0);
  });

  it("leaves it out where the layer is held laminar or transition is not reached", () => {
    for (const transition of [{ kind: "laminar" }, natural(3e6), natural(2e6), tripped(2), tripped(5)]) {
      const result = answer({ transition });
      expect(result, JSON.stringify(transition)).not.toHaveProperty("transitionAt");
      expect(result.frictionLineUsed).toBe("blasius");
      expectRelative(result.drag, (50 * blasiusFrictionIntegral(2e6)) / 1e6, 1e-12);
    }
  });

  it("takes a trip at the end for laminar, however the end is summed up", () => {
    const result = answer({ runUp: 0.1, length: 0.2, transition: tripped(0.3) });
    expect(result).not.toHaveProperty("transitionAt");
    expect(result.frictionLineUsed).toBe("blasius");
  });

  it.each([natural(9999), natural(1), tripped(0.0099), tripped(1e-6)])(
    "refuses %o wherever the plate ends",
    (transition) => {
      for (const length of [0.005, 2]) {
        expect(refusalOf(PLAIN, plate({ transition, length }))).toMatch(/^Transition at Re .* is below Re 10000/);
      }
      for (const frictionLine of ["one-seventh-law", "fully-rough", "momentum-integral"]) {
        expect(refusalOf(PLAIN, plate({ transition, frictionLine, roughness: 1e-3 }))).toMatch(/^Transition/);
      }
    },
  );

  it("admits Re 1e4 itself and a trip at 0", () => {
    expect(answer({ transition: natural(1e4) }).transitionAt).toBeCloseTo(0.01, 12);
    expect(answer({ transition: tripped(0.01) }).transitionAt).toBe(0.01);
  });

  it("takes off the laminar stretch with the exact A of the line in use (1613.8 and 1742.6 at Re 5e5, not 1700)", () => {
    const lost = (frictionLine: string): number =>
      ((answer({ frictionLine, transition: tripped(0) }).drag - answer({ frictionLine }).drag) / 50) * 1e6;
    expectRelative(lost("prandtl-schlichting"), 1613.81, 1e-5);
    expectRelative(lost("one-fifth-law"), 1742.65, 1e-5);
  });

  it("lets an earlier transition take effect only where the line has crossed Blasius", () => {
    const early = answer({ frictionLine: "one-seventh-law", transition: natural(2e4), length: 0.03 });
    expect(early.frictionLineUsed).toBe("blasius");
    expectRelative(early.transitionAt, 0.02, 1e-12);
    const fromStart = answer({ frictionLine: "one-seventh-law", transition: tripped(0) });
    expectRelative(answer({ frictionLine: "one-seventh-law", transition: natural(2e4) }).drag, fromStart.drag, 1e-13);
  });

  it("gives a fully rough line no Blasius part: its excess over Blasius may be negative", () => {
    const fields = { frictionLine: "fully-rough", roughness: 1e-6, transition: natural(1e4) };
    // C_F(x/k_s = 1e4) = 0.0049339 against Blasius 0.01328 at Re 1e4: 83.5 more than turbulent from the start.
    const gain = ((answer(fields).drag - answer({ ...fields, transition: tripped(0) }).drag) / 50) * 1e6;
    expectRelative(gain, 132.8 - 49.3385469397, 1e-9);
    expect(answer({ ...fields, length: 0.005, transition: tripped(0) }).frictionLineUsed).toBe("fully-rough");
  });
});

describe("the automatic line", () => {
  it("is the greater of two F, each with its own laminar stretch taken off", () => {
    const fields = { roughness: 9e-5, transition: natural(5e5), length: 3 };
    const smooth = answer({ ...fields, frictionLine: "prandtl-schlichting" });
    const rough = answer({ ...fields, frictionLine: "fully-rough" });
    const automatic = answer(fields);
    expect(automatic.drag).toBe(Math.max(smooth.drag, rough.drag));
    expect(automatic.frictionLineUsed).toBe("fully-rough");
    expect(automatic.roughnessVerdict).toBe("smooth");
    expect(noteCodes(PLAIN, plate(fields))).toContain("rough-line-governs-smooth-surface");
    expectRelative(automatic.localCoefficient, rough.localCoefficient ?? NaN, 1e-15);
  });

  it("takes a rough layer for turbulent from its start, and says so, unless it is held laminar", () => {
    for (const transition of [natural(5e5), tripped(0.7), tripped(5)]) {
      const result = answer({ roughness: 2e-4, transition });
      expect(result.transitionAt, JSON.stringify(transition)).toBe(0);
      expectRelative(result.drag, answer({ roughness: 2e-4, transition: tripped(0) }).drag, 1e-15);
      expect(result.notes.map(({ code }) => code)).toContain("roughness-turbulent-from-start");
    }
    const held = answer({ roughness: 2e-4, transition: { kind: "laminar" } });
    expect(held.frictionLineUsed).toBe("blasius");
    const codes = held.notes.map(({ code }) => code);
    expect(codes).toContain("laminar-on-rough-surface");
    expect(codes).not.toContain("roughness-turbulent-from-start");
  });

  it("counts a roughness as smooth at the admissible height that it prints, and no further", () => {
    const { admissibleRoughness = NaN } = answer({});
    expect(answer({ roughness: admissibleRoughness }).roughnessVerdict).toBe("smooth");
    expect(answer({ roughness: admissibleRoughness * 1.000001 }).roughnessVerdict).toBe("between");
    expect(answer({ roughness: 5e-3 }).roughnessVerdict).toBe("rough");
  });

  it("puts the momentum integral beside it between the regimes", () => {
    const fields = { roughness: 3e-4 };
    const result = answer(fields);
    const beside = answer({ ...fields, frictionLine: "momentum-integral", transition: tripped(0) });
    const note = result.notes.find(({ code }) => code === "regime-between");
    expect(note?.sentence).toContain(`the momentum integral ${Number(beside.drag.toPrecision(3))} N`);
    expect(noteCodes(PLAIN, plate({}))).not.toContain("regime-between");
  });

  it("leaves a named line as it was asked for on a rough surface, laminar stretch and all, with a caution", () => {
    const rough = answer({ frictionLine: "prandtl-schlichting", roughness: 2e-4 });
    expectRelative(rough.drag, answer({ frictionLine: "prandtl-schlichting" }).drag, 1e-15);
    expect(rough.notes.map(({ code }) => code)).toContain("roughness-above-admissible");
  });
});

describe("quantities at the end of the layer", () => {
  it("has θ = ½ F from the start of the layer, also behind a run-up", () => {
    const whole = answer({ length: 3 });
    const behind = answer({ length: 2, runUp: 1 });
    for (const key of [
      "reynolds",
      "momentumThickness",
      "thickness",
      "displacementThickness",
      "localCoefficient",
    ] as const) {
      expectRelative(behind[key], whole[key] ?? NaN, 1e-12, key);
    }
    expectRelative(whole.momentumThickness, (whole.meanCoefficient ?? NaN) * 1.5, 1e-13);
    expectRelative(behind.meanCoefficient, behind.drag / (50 * 2), 1e-13);
  });

  it("leaves the form factor out of local values and of the mean coefficient", () => {
    const [plain, formed] = [answer({}), answer({ formFactor: 1.2 })];
    expectRelative(formed.drag, 1.2 * plain.drag, 1e-14);
    for (const key of ["meanCoefficient", "localCoefficient", "wallShearStress", "momentumThickness"] as const) {
      expectRelative(formed[key], plain[key] ?? NaN, 1e-14, key);
    }
  });

  it("runs everything at the local speed", () => {
    const local = answer({ localSpeedRatio: 1.5 });
    const faster = answerOf({ ...PLAIN, speed: 15 }, plate({}));
    for (const key of ["drag", "reynolds", "admissibleRoughness", "wallShearStress", "transitionAt"] as const) {
      expectRelative(local[key], faster[key] ?? NaN, 1e-13, key);
    }
  });

  it.each([
    ["laminar, Blasius", { transition: { kind: "laminar" } }, 1.7208 / 0.664, 5 / 0.664],
    ["one-fifth law", { frictionLine: "one-fifth-law" }, 9 / 7, 72 / 7],
    ["one-seventh law", { frictionLine: "one-seventh-law", transition: tripped(0) }, 9 / 7, 72 / 7],
  ])("%s: δ* and δ follow from θ by its own profile, without a note", (_name, fields, shape, ratio) => {
    const result = answer(fields);
    expectRelative((result.displacementThickness ?? NaN) / (result.momentumThickness ?? NaN), shape, 1e-13);
    expectRelative((result.thickness ?? NaN) / (result.momentumThickness ?? NaN), ratio, 1e-13);
    expect(result.notes.map(({ code }) => code)).not.toContain("thickness-by-wall-and-wake");
  });

  it("borrows the wall-and-wake profile for lines without one, says so, and caps its roughness at x/100", () => {
    const borrowed = answer({ frictionLine: "white", transition: tripped(0) });
    expect(borrowed.notes.map(({ code }) => code)).toContain("thickness-by-wall-and-wake");
    // Smooth, Re_θ about 4000: H is near 1.38 by any log law, δ/θ near 8.
    expect((borrowed.displacementThickness ?? NaN) / (borrowed.momentumThickness ?? NaN)).toBeCloseTo(1.38, 1);
    const rough = { frictionLine: "fully-rough", transition: tripped(0) };
    const capped = answer({ ...rough, roughness: 0.02 });
    const beyond = answer({ ...rough, roughness: 0.5 });
    expectRelative(beyond.momentumThickness, capped.momentumThickness ?? NaN, 1e-13);
    expectRelative(beyond.displacementThickness, capped.displacementThickness ?? NaN, 1e-13);
  });

  it("has k_s⁺ from the local coefficient of the answer", () => {
    const result = answer({ roughness: 2e-3 });
    expectRelative(result.roughnessReynolds, 2000 * Math.sqrt((result.localCoefficient ?? NaN) / 2), 1e-13);
  });

  it.each([
    [0.000999, /^Re 999 .* outside every friction line/],
    [10001, /^Re 1\.00 × 10¹⁰ .* outside every friction line/],
  ])("refuses a layer that ends at %f m", (length, sentence) => {
    expect(refusalOf(PLAIN, plate({ length }))).toMatch(sentence);
    expect(answerOf(PLAIN, plate({ length: 0.001 })).reynolds).toBeCloseTo(1000, 6);
    expect(answerOf(PLAIN, plate({ length: 10000 })).reynolds).toBeCloseTo(1e10, 0);
  });
});
