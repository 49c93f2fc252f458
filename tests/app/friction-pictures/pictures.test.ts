import { describe, expect, it } from "vitest";
import { dragOverSpeed, dragOverSpeedLayout } from "@/app/(workspace)/_friction-pictures/drag-over-speed";
import { frictionChart } from "@/app/(workspace)/_friction-pictures/friction-chart";
import { frictionChartLayout } from "@/app/(workspace)/_friction-pictures/friction-chart-layout";
import { frictionSubject } from "@/app/(workspace)/_friction-pictures/friction-subject";
import { layerGrowth } from "@/app/(workspace)/_friction-pictures/layer-growth";
import { growthLayout, shearLayout } from "@/app/(workspace)/_friction-pictures/layer-layouts";
import { FRICTION_LINE_CHOICES } from "@/lib/aero/friction/friction-line-name";
import { type InputOf, MethodInput } from "@/lib/evaluation/document/schema";
import { evaluateMethod } from "@/lib/evaluation/methods/method-registry";
import { layerStretches } from "@/lib/evaluation/methods/layer-stretches";
import type { StreamState } from "@/lib/evaluation/methods/stream-state";

/** Round numbers: Re = 2·10⁶ at 1 m, q = 450 Pa. */
const STREAM: StreamState = {
  density: 1,
  dynamicViscosity: 1.5e-5,
  kinematicViscosity: 1.5e-5,
  speed: 30,
  dynamicPressure: 450,
};

function plate(fields: Partial<InputOf<"flat-plate-friction">> = {}): MethodInput {
  return MethodInput.parse({ method: "flat-plate-friction", length: 2, breadth: 1, faces: 1, ...fields });
}

function subjectOf(input: MethodInput) {
  const subject = frictionSubject(1, input, STREAM);
  if (!subject) throw new Error("nothing to draw");
  return subject;
}

function answerOf(input: MethodInput) {
  const outcome = evaluateMethod(input.method, 1, input, STREAM);
  if (outcome.outcome === "refused") throw new Error("refused");
  return outcome.answer;
}

describe("the friction chart", () => {
  it("has the published values of its lines", () => {
    const { laminar, turbulent, family } = frictionChart(subjectOf(plate()));

    // Blasius 1.328/√Re at Re 10⁴; Prandtl–Schlichting 0.455/(log₁₀ Re)^2.58 at Re 10⁷ = 0.0030037, as printed in the formula's source.
    expect(laminar[0]).toMatchObject({ reynolds: expect.closeTo(1e4, 6), coefficient: expect.closeTo(0.01328, 8) });
    const atTenMillion = turbulent.find(({ reynolds }) => Math.abs(reynolds / 1e7 - 1) < 1e-6);
    expect(atTenMillion?.coefficient).toBeCloseTo(0.0030037, 7);
    // Fully rough plate at L/k_s = 10⁴: 0.0049339, whatever the Re (Prandtl & Schlichting 1934).
    const coefficients = family.find(({ lengthOverRoughness }) => lengthOverRoughness === 1e4)?.points ?? [];
    expect(coefficients.length).toBeGreaterThan(10);
    for (const { coefficient } of coefficients) expect(coefficient).toBeCloseTo(0.0049339, 7);
  });

  it("lets a rough surface leave the smooth line, never cross under it", () => {
    const { family, turbulent } = frictionChart(subjectOf(plate()));

    for (const { points } of family) {
      for (const { reynolds, coefficient } of points) {
        const smooth = turbulent.find((point) => point.reynolds === reynolds)?.coefficient ?? Infinity;
        expect(coefficient).toBeGreaterThanOrEqual(smooth);
      }
    }
  });

  it("puts the item's own point where its layer ends, and below it where another surface lies ahead", () => {
    const alone = frictionChart(subjectOf(plate()));
    expect(alone.own.coefficient).toBeCloseTo(alone.layer.at(-1)?.coefficient ?? 0, 12);
    expect(alone.own).toMatchObject({ reynolds: answerOf(plate()).reynolds });

    const behind = frictionChart(subjectOf(plate({ runUp: 3 })));
    expect(behind.own.reynolds).toBeCloseTo(1e7, 3);
    expect(behind.own.coefficient).toBeLessThan(behind.layer.at(-1)?.coefficient ?? 0);
  });

  it("keeps the item's point inside the picture, however small or laminar it is", () => {
    for (const fields of [
      { length: 0.001 },
      { length: 2, transition: { kind: "laminar" as const } },
      { length: 500, transition: { kind: "laminar" as const } },
      { length: 0.01, roughness: 0.002 },
    ]) {
      const { marks } = frictionChartLayout(frictionChart(subjectOf(plate(fields))));

      expect(marks).toHaveLength(1);
      for (const { x, y } of marks) {
        expect(x).toBeGreaterThanOrEqual(0);
        expect(x).toBeLessThanOrEqual(1);
        expect(y).toBeGreaterThanOrEqual(0);
        expect(y).toBeLessThanOrEqual(1);
      }
    }
  });
});

describe("the layer along the plate", () => {
  it("ends with what the item's own answer says", () => {
    const input = plate({ roughness: 1e-4, runUp: 0.5 });
    const { thickness, displacementThickness, momentumThickness, wallShearStress } = answerOf(input);

    expect(layerGrowth(subjectOf(input)).stations.at(-1)).toMatchObject({
      place: 2.5,
      thickness,
      displacementThickness,
      momentumThickness,
      wallShearStress,
    });
  });

  it("is Blasius's before transition: δ = 5.0 x/√Re, δ* = 1.7208 x/√Re, θ = 0.664 x/√Re", () => {
    const { stations, transitionAt } = layerGrowth(subjectOf(plate()));
    const laminar = stations.filter(({ regime }) => regime === "laminar");

    expect(transitionAt).toBeCloseTo(0.25, 12);
    expect(laminar.length).toBeGreaterThan(5);
    for (const { place, thickness, displacementThickness, momentumThickness } of laminar) {
      const scale = place / Math.sqrt((30 * place) / 1.5e-5);
      expect(thickness / scale).toBeCloseTo(5, 6);
      expect(displacementThickness / scale).toBeCloseTo(1.7208, 6);
      expect(momentumThickness / scale).toBeCloseTo(0.664, 6);
    }
  });

  it("changes regime where the stretches of the layer do", () => {
    const input = plate({ runUp: 0.1, transition: { kind: "tripped", at: 0.6 } });
    const growth = layerGrowth(subjectOf(input));

    expect(growth.transitionAt).toBeCloseTo(layerStretches(1, input, STREAM)[1]?.from ?? NaN, 9);
    expect(growthLayout(growth).bands.map(({ word }) => word)).toEqual(["laminar", "run-up"]);
  });

  it.each(FRICTION_LINE_CHOICES)("grows without a gap by %s, smooth and rough", (frictionLine) => {
    for (const roughness of [1e-5, 1e-3]) {
      const growth = layerGrowth(subjectOf(plate({ frictionLine, roughness, length: 4 })), 21);
      const thetas = growth.stations.map(({ momentumThickness }) => momentumThickness);

      expect(thetas.every((theta, at) => theta > (thetas[at - 1] ?? 0))).toBe(true);
      for (const { x, y } of [growthLayout(growth), shearLayout(growth)].flatMap(({ curves }) =>
        curves.flatMap(({ points }) => points),
      )) {
        expect(Number.isFinite(x) && Number.isFinite(y)).toBe(true);
      }
    }
  });

  it("has nothing to draw of a method without a layer, or of an item that is refused", () => {
    const fixed = MethodInput.parse({ method: "fixed", force: 3 });

    expect(frictionSubject(1, fixed, STREAM)).toBeNull();
    expect(frictionSubject(1, plate({ length: 1e-5 }), STREAM)).toBeNull();
  });
});

describe("drag over speed", () => {
  it("rises with the square of the speed for a drag area", () => {
    const input = MethodInput.parse({ method: "drag-area", dragArea: 0.1 });
    const points = dragOverSpeed(1, input, STREAM, 16);

    for (const { speed, drag } of points) expect(drag).toBeCloseTo(0.5 * speed ** 2 * 0.1, 9);
    expect(points[9]?.speed).toBeCloseTo(30, 9);
  });

  it("leaves out the speeds at which the method refuses the item", () => {
    const input = plate({ length: 0.001 });
    const points = dragOverSpeed(1, input, STREAM, 16);
    const layout = dragOverSpeedLayout([{ word: null, points, own: { speed: 30, drag: answerOf(input).drag } }]);

    expect(points.filter(({ drag }) => drag === null).length).toBeGreaterThan(0);
    expect(layout.curves[0]?.points).toHaveLength(points.filter(({ drag }) => drag !== null).length);
  });

  it("draws a saving below zero", () => {
    const input = MethodInput.parse({ method: "drag-area", dragArea: -0.1, saving: true });
    const layout = dragOverSpeedLayout([
      { word: null, points: dragOverSpeed(1, input, STREAM, 16), own: { speed: 30, drag: -45 } },
    ]);

    expect(layout.yTicks.some(({ label }) => label?.startsWith("−"))).toBe(true);
    expect(layout.marks[0]?.y).toBeGreaterThanOrEqual(0);
  });
});

describe("two settings in one picture", () => {
  it("stand on one friction chart where each stands on its own, told apart by sign and word", () => {
    const [smooth, rough] = [plate(), plate({ roughness: 1e-3 })].map((input) => frictionChart(subjectOf(input)));
    if (!smooth || !rough) throw new Error("no charts");
    const { marks } = frictionChartLayout(smooth, rough);

    expect(marks.map(({ sign, text }) => `${sign} ${text.slice(0, 2)}`)).toEqual(["ring A,", "square B,"]);
    // The same axes as of one alone: neither widens the chart here.
    expect(marks[0]).toMatchObject({
      x: frictionChartLayout(smooth).marks[0]?.x,
      y: frictionChartLayout(smooth).marks[0]?.y,
    });
    expect(marks[1]).toMatchObject({
      x: frictionChartLayout(rough).marks[0]?.x,
      y: frictionChartLayout(rough).marks[0]?.y,
    });
    expect(marks.map(({ side }) => side)).toEqual(["below", "above"]);
  });

  it("have their drags over speed on the axes of both", () => {
    const input = MethodInput.parse({ method: "drag-area", dragArea: 0.1 });
    const curve = (word: "A" | "B", speed: number) => {
      const stream = { ...STREAM, speed, dynamicPressure: 0.5 * speed ** 2 };
      return { word, points: dragOverSpeed(1, input, stream), own: { speed, drag: 0.05 * speed ** 2 } };
    };
    const { curves, marks } = dragOverSpeedLayout([curve("A", 10), curve("B", 30)]);

    expect(curves.map(({ look }) => look)).toEqual(["own", "dashed"]);
    expect(marks.map(({ sign }) => sign)).toEqual(["ring", "square"]);
    // One method in one fluid: at three times the speed nine times the drag, on one and the same axis.
    expect((marks[1]?.x ?? 0) / (marks[0]?.x ?? 1)).toBeCloseTo(3, 9);
    expect((marks[1]?.y ?? 0) / (marks[0]?.y ?? 1)).toBeCloseTo(9, 9);
  });
});
