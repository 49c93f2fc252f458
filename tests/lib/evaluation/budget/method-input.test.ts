import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { indexState } from "@/lib/evaluation/budget/indexed-state";
import { methodInputOf, streamInputOf } from "@/lib/evaluation/budget/method-input";
import { MethodInput, StreamPointInput } from "@/lib/evaluation/document/schema";
import type { ItemBody } from "@/lib/evaluation/lines/item-body";
import { FRICTION_LINE_CHOICES } from "@/lib/aero/friction/friction-line-name";
import type { LineState } from "@/lib/evaluation/lines/line-state";
import { parseBody } from "@/lib/evaluation/lines/parse-body";
import { budgetState } from "@/tests/support/budget-state";

const AIR = {
  name: "Cruise",
  fluid: "air",
  staticTemperature: { value: 288.15 },
  staticPressure: { value: 101325 },
  speed: { value: 25 },
};
const STATE = budgetState({
  code: "T-1",
  name: "Test",
  kind: "vehicle_fairing",
  point: AIR,
  otherPoints: { "OP-2": { ...AIR, pressureAltitude: { value: 3000 }, staticPressure: null, staticTemperature: null } },
  limitHundredths: 10000,
  reserveHundredths: 500,
  finishes: { F10: { name: "paint", roughness: { value: 6e-6 }, source: "judgement" } },
  items: {},
});

const number = fc.oneof(
  fc.constantFrom(0, 1, -1, 1e-12, 1e12, 5e5, 1e-13),
  fc.double({ min: -2, max: 20, noNaN: true }),
  fc.integer({ min: -1, max: 9 }).map((exponent) => 10 ** -exponent),
);
const quantity = fc.record({ value: number, standardUncertainty: fc.constantFrom(undefined, 0, 0.01) });
const maybe = <T>(arbitrary: fc.Arbitrary<T>) => fc.option(arbitrary, { nil: null, freq: 2 });
const flag = fc.boolean();
const common = {
  name: fc.constant("x"),
  ownerId: fc.constant(1),
  order: fc.constant(1),
  grade: fc.constantFrom("estimated", "released"),
  methodVersion: fc.constant(1),
  saving: flag,
};
const friction = {
  finish: maybe(fc.constant("F10")),
  roughness: maybe(quantity),
  transition: fc.constantFrom("natural", "tripped", "laminar"),
  criticalReynolds: fc.constantFrom(1e3, 1e4, 5e5, 3e6),
  trippedAt: quantity,
  frictionLine: fc.constantFrom(...FRICTION_LINE_CHOICES),
};
const source = fc.constant("judgement");
const bodies = fc.oneof(
  fc.record({
    ...common,
    ...friction,
    method: fc.constant("flat-plate-friction"),
    length: quantity,
    breadth: quantity,
    faces: fc.integer({ min: 0, max: 9 }),
    runUp: quantity,
    localSpeedRatio: number,
    formFactor: number,
  }),
  fc.record({
    ...common,
    ...friction,
    method: fc.constant("duct-entry"),
    width: quantity,
    height: quantity,
    length: quantity,
  }),
  fc.record({
    ...common,
    method: fc.constant("loss-coefficient"),
    source,
    lossCoefficient: number,
    coefficientUncertainty: maybe(number),
    flowArea: quantity,
    localSpeedRatio: number,
  }),
  fc.record({
    ...common,
    method: fc.constant("bluff-body"),
    source,
    dragCoefficient: number,
    coefficientUncertainty: maybe(number),
    referenceArea: quantity,
    shelterFactor: number,
    shelterReason: fc.constant("cab"),
    localSpeedRatio: number,
  }),
  fc.record({ ...common, method: fc.constant("drag-area"), source, dragArea: quantity, localSpeedRatio: number }),
  fc.record({ ...common, method: fc.constant("fixed"), source, force: quantity }),
  fc.record({
    ...common,
    method: fc.constant("measured"),
    source,
    force: quantity,
    testFluid: fc.constantFrom("air", "fresh-water", "custom"),
    testTemperature: maybe(fc.constantFrom({ value: 15 }, { value: 288.15 }, { value: 500 })),
    testPressure: maybe(fc.constantFrom({ value: 101325 }, { value: 1 })),
    testDensity: maybe(quantity),
    testDynamicViscosity: maybe(quantity),
    testSpeed: quantity,
    testDate: fc.constant("2026-01-01"),
  }),
);

function stateWith(body: ItemBody) {
  const item: LineState = { kind: "item", number: "010", letter: "–", issue: 1, retired: false, body };
  return { ...STATE, lines: [...STATE.lines, item] };
}

describe("a body that its schema lets through", () => {
  it("gives an input that the evaluation's own schema lets through, and results that are finite", () => {
    let taken = 0;
    fc.assert(
      fc.property(bodies, (json) => {
        const parsed = parseBody("item", json);
        if (!parsed.ok || parsed.content.kind !== "item" || parsed.content.body.method === "share") return;
        taken += 1;
        const { body } = parsed.content;
        const input = methodInputOf(body, indexState(stateWith(body)));
        expect(MethodInput.safeParse(input).error?.issues ?? []).toEqual([]);
        for (const { items } of evaluateBudget(stateWith(body)).points) {
          for (const { basic, predicted } of items) expect([basic, predicted].every(Number.isFinite)).toBe(true);
        }
      }),
      { numRuns: 1500 },
    );
    expect(taken).toBeGreaterThan(150);
  });

  it("of an operating point gives a stream that the evaluation's own schema lets through", () => {
    for (const point of indexState(STATE).operatingPoints.values()) {
      expect(StreamPointInput.safeParse(streamInputOf(point)).success).toBe(true);
    }
  });
});
