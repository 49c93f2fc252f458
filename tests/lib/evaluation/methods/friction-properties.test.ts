import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { FRICTION_LINE_CHOICES } from "@/lib/aero/friction/friction-line-name";
import { expectRelative } from "@/tests/support/relative";
import { answerOf, evaluateItems, PLAIN } from "./evaluate-one";

const isRoughLine = (line: string): boolean => line.startsWith("fully-rough");

/** A number spread evenly over its powers of ten. */
const logarithmic = (min: number, max: number) =>
  fc.double({ min: Math.log10(min), max: Math.log10(max), noNaN: true }).map((log) => 10 ** log);

const line = fc.constantFrom(...FRICTION_LINE_CHOICES);
const transition = fc.oneof(
  logarithmic(1e4, 5e6).map((criticalReynolds) => ({ kind: "natural", criticalReynolds })),
  fc.constant({ kind: "tripped", at: 0 }),
  logarithmic(0.0101, 20).map((at) => ({ kind: "tripped", at })),
  fc.constant({ kind: "laminar" }),
);
/** In `PLAIN`, Re is 1e6 times a length: 1 µm is Re_k 1, 100 µm the admissible roughness. */
const roughness = fc.oneof(fc.constant(0), logarithmic(1e-8, 1));
const surface = fc.record({ frictionLine: line, transition, roughness }).map(withRoughness);

function withRoughness<T extends { frictionLine: string; roughness: number }>(fields: T): T {
  return isRoughLine(fields.frictionLine) && fields.roughness < 1e-12 ? { ...fields, roughness: 1e-4 } : fields;
}

const plate = (fields: object) => ({ method: "flat-plate-friction", breadth: 1, faces: 1, ...fields });
const dragOf = (fields: object, point: object = PLAIN): number => answerOf(point, plate(fields)).drag;
const runs = { numRuns: 400 };

describe("friction of a plate, for every line, transition and roughness", () => {
  it("is the sum over any split of the plate", () => {
    const split = fc.record({
      surface,
      start: fc.oneof(fc.constant(0), logarithmic(1e-4, 5)),
      length: logarithmic(0.02, 20),
      at: fc.double({ min: 0.001, max: 0.999, noNaN: true }),
    });
    fc.assert(
      fc.property(split, ({ surface: fields, start, length, at }) => {
        const middle = start + length * at;
        const pieces: [number, number][] = [
          [start, middle - start],
          [middle, start + length - middle],
        ];
        fc.pre(pieces.every(([runUp, part]) => part > 1e-9 && runUp + part >= 1.001e-3));
        const whole = dragOf({ ...fields, runUp: start, length });
        const sum = pieces.reduce((total, [runUp, part]) => total + dragOf({ ...fields, runUp, length: part }), 0);
        expectRelative(sum, whole, 1e-9, JSON.stringify({ fields, start, length, at }));
      }),
      runs,
    );
  });

  it("rises with length, and with speed where roughness brings no jump", () => {
    fc.assert(
      fc.property(surface, logarithmic(0.02, 50), logarithmic(1.0001, 3), (fields, length, factor) => {
        expect(dragOf({ ...fields, length: length * factor })).toBeGreaterThan(dragOf({ ...fields, length }));
      }),
      runs,
    );
    fc.assert(
      fc.property(line, logarithmic(0.02, 50), logarithmic(1.001, 3), (frictionLine, length, factor) => {
        const fields = withRoughness({ frictionLine, roughness: 0, length });
        expect(dragOf(fields, { ...PLAIN, speed: 10 * factor })).toBeGreaterThan(dragOf(fields));
      }),
      runs,
    );
  });

  it("is raised by roughness on a whole plate, where the line knows roughness", () => {
    const knowing = fc.constantFrom("automatic", "momentum-integral", "fully-rough", "fully-rough-mills-hang");
    fc.assert(
      fc.property(
        knowing,
        logarithmic(0.05, 50),
        logarithmic(1e-6, 1e-2),
        logarithmic(1.05, 30),
        (frictionLine, length, finish, factor) => {
          const fields = { frictionLine, length, transition: { kind: "tripped", at: 0 } };
          const smoother = dragOf({ ...fields, roughness: finish });
          expect(dragOf({ ...fields, roughness: finish * factor })).toBeGreaterThanOrEqual(smoother);
        },
      ),
      runs,
    );
  });

  it("is lowered by a longer run-up behind a trip at 0, where the layer is turbulent", () => {
    fc.assert(
      fc.property(
        line,
        // From Re 50,000 on no line is Blasius's any more, and a fully rough one follows its formula.
        logarithmic(0.05, 50),
        logarithmic(1.001, 10),
        logarithmic(0.02, 20),
        (frictionLine, runUp, factor, length) => {
          const fields = withRoughness({ frictionLine, roughness: 0, transition: { kind: "tripped", at: 0 }, length });
          expect(dragOf({ ...fields, runUp: runUp * factor })).toBeLessThan(dragOf({ ...fields, runUp }));
        },
      ),
      runs,
    );
  });

  it("rises along the surface: no stretch of a layer has friction of 0 or less", () => {
    const stretch = fc.record({
      surface,
      runUp: fc.oneof(fc.constant(0), logarithmic(1e-9, 900)),
      length: logarithmic(1e-12, 900),
    });
    fc.assert(
      fc.property(stretch, ({ surface: fields, runUp, length }) => {
        fc.pre(runUp + length >= 1e-3);
        const answer = answerOf(PLAIN, plate({ ...fields, runUp, length }));
        for (const [name, value] of Object.entries(answer)) {
          if (typeof value === "number") expect(Number.isFinite(value), `${name} ${value}`).toBe(true);
        }
        expect(answer.drag).toBeGreaterThan(0);
        expect(answer.localCoefficient).toBeGreaterThan(0);
        expect(answer.meanCoefficient).toBeGreaterThan(0);
        expect(answer.displacementThickness).toBeGreaterThan(answer.momentumThickness ?? NaN);
        expect(answer.thickness).toBeGreaterThan(answer.displacementThickness ?? NaN);
      }),
      { numRuns: 1500 },
    );
  });
});

describe("anything that validation lets through", () => {
  const wide = logarithmic(1e-12, 1e12);
  const item = fc
    .record({
      length: wide,
      breadth: wide,
      faces: fc.integer({ min: 1, max: 1000 }),
      runUp: fc.oneof(fc.constant(0), wide),
      roughness: fc.oneof(fc.constant(0), fc.constant(5e-324), wide),
      frictionLine: line,
      transition: fc.oneof(
        wide.map((criticalReynolds) => ({ kind: "natural", criticalReynolds })),
        wide.map((at) => ({ kind: "tripped", at })),
        fc.constant({ kind: "laminar" }),
      ),
      localSpeedRatio: wide,
      formFactor: wide,
    })
    .map(withRoughness);
  const point = fc.record({ fluid: fc.constant("custom"), density: wide, dynamicViscosity: wide, speed: wide });
  const duct = fc.record({ width: wide, height: wide });

  it("is refused or finite, never NaN, infinite or negative", () => {
    fc.assert(
      fc.property(point, item, duct, wide, (stream, fields, sides, re) => {
        // Speed is set so that about Re 1e3 to 1e10 is met often.
        const reynolds = 10 ** (3 + (Math.log10(re) + 12) * (7 / 24));
        const speed =
          (reynolds * stream.dynamicViscosity) /
          stream.density /
          (fields.length + fields.runUp) /
          fields.localSpeedRatio;
        fc.pre(speed >= 1e-12 && speed <= 1e12);
        const { length, roughness: finish, frictionLine, transition: kind } = fields;
        const ductItem = { method: "duct-entry", length, roughness: finish, frictionLine, transition: kind, ...sides };
        for (const answer of evaluateItems({ ...stream, speed }, [plate(fields), ductItem])) {
          if ("refused" in answer) continue;
          for (const [name, value] of Object.entries(answer)) {
            if (typeof value === "number") expect(Number.isFinite(value) && value >= 0, `${name} ${value}`).toBe(true);
          }
          expect(answer.drag).toBeGreaterThan(0);
          for (const { sentence } of answer.notes) expect(sentence).not.toMatch(/NaN|Infinity|undefined/);
        }
      }),
      { numRuns: 2000 },
    );
  });
});

describe("continuity", () => {
  /** F just before and just after a place, as drags of two plates. */
  const jumpAt = (fields: object, length: number): number => {
    const before = dragOf({ ...fields, length: length * (1 - 1e-9) });
    const after = dragOf({ ...fields, length: length * (1 + 1e-9) });
    return after / before - 1;
  };

  it.each(FRICTION_LINE_CHOICES)(
    "%s: F has no jump at transition, at a crossing or where a coefficient is held",
    (frictionLine) => {
      for (const finish of isRoughLine(frictionLine) ? [1e-6, 1e-4, 5e-3] : [0, 1e-6, 9e-5, 5e-3]) {
        for (const kind of [
          { kind: "natural", criticalReynolds: 5e5 },
          { kind: "natural", criticalReynolds: 1.1e4 },
          { kind: "tripped", at: 0.08 },
          { kind: "tripped", at: 0 },
        ]) {
          const fields = { frictionLine, roughness: finish, transition: kind };
          for (const length of [0.01, 0.011, 0.0121076, 0.0151317, 0.0213526, 0.0370802, 0.08, 0.5, 100 * finish]) {
            if (length >= 0.002)
              expect(Math.abs(jumpAt(fields, length)), JSON.stringify({ fields, length })).toBeLessThan(1e-7);
          }
        }
      }
    },
  );

  it("automatic: the one jump is upward, where roughness passes the admissible height", () => {
    const fields = { length: 1, frictionLine: "automatic" };
    const below = dragOf({ ...fields, roughness: 1e-4 * (1 - 1e-6) });
    const above = dragOf({ ...fields, roughness: 1e-4 * (1 + 1e-6) });
    expect(above).toBeGreaterThan(1.2 * below);
    const laminar = { ...fields, transition: { kind: "laminar" } };
    expectRelative(dragOf({ ...laminar, roughness: 2e-4 }), dragOf({ ...laminar, roughness: 5e-5 }), 1e-15);
  });

  it("automatic: the drag is continuous in roughness where the rough line comes to govern", () => {
    const fields = { length: 1, frictionLine: "automatic", transition: { kind: "tripped", at: 0 } };
    for (let log = -6; log < -2; log += 0.02) {
      const finish = 10 ** log;
      expectRelative(dragOf({ ...fields, roughness: finish * 1.0001 }), dragOf({ ...fields, roughness: finish }), 1e-4);
    }
  });
});
