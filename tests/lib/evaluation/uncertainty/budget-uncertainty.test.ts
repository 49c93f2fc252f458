import { describe, expect, it } from "vitest";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import type { BudgetState, LineState } from "@/lib/evaluation/lines/line-state";
import { streamStateOf } from "@/lib/evaluation/methods/stream-state";
import { OWN_UNCERTAINTIES } from "@/lib/evaluation/methods/own-uncertainties";
import { budgetUncertainty } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import { budgetDrawer } from "@/lib/evaluation/uncertainty/draw-budget";
import { seededStream } from "@/lib/evaluation/uncertainty/xoshiro";
import { sideFairing, signPanel, supplyDuct } from "@/tests/support/demo-budgets";
import { expectRelative } from "@/tests/support/relative";
import {
  body,
  budget,
  CUSTOM,
  fixed,
  item,
  modelOf,
  newtonsOf,
  plate,
  share,
  spread,
  uncertaintyOf,
} from "./uncertain-budget";

/** ΣB of the budget with one quantity of one line set to another value, by the evaluation that issues are made with. */
function basicWith(state: BudgetState, kind: LineState["kind"], number: string, field: string, value: number): number {
  const lines = structuredClone(state.lines);
  const line = lines.find((each) => each.kind === kind && each.number === number);
  if (!line) throw new Error(`no ${kind} ${number}`);
  const fields: Record<string, unknown> = line.body as never;
  fields[field] = typeof fields[field] === "number" ? value : { value };
  return evaluateBudget({ ...state, lines }).points[0]?.totals.basic ?? Number.NaN;
}

/** u·∂ΣB/∂x by a plain central difference, wide enough for totals of 12 digits. */
function centralDifference(state: BudgetState, key: string, value: number, u: number): number {
  const [kind = "", number = "", field = ""] = key.split(":");
  const at = (x: number): number => basicWith(state, kind as LineState["kind"], number, field, x);
  const h = 1e-4 * value;
  return (u * (at(value + h) - at(value - h))) / (2 * h);
}

const AIR = {
  fluid: "air",
  staticTemperature: spread(288.15, 2),
  staticPressure: spread(101325, 800),
  speed: spread(25, 0.3),
};

const MIXED = budget(
  {
    "010": plate(spread(2.4, 0.03), spread(0.95, 0.02), 2, { finish: "F10", roughness: null, transition: "natural" }),
    "020": plate(spread(1.6, 0.02), spread(0.95, 0.02), 2, {
      finish: "F10",
      roughness: null,
      frictionLine: "momentum-integral",
      liesBehind: "010",
      runUpFollows: true,
    }),
    "030": plate(spread(3, 0.05), spread(0.4, 0.01), 1, {
      finish: "F20",
      roughness: null,
      frictionLine: "fully-rough",
    }),
    "040": body(0.6, 0.05, spread(0.05, 0.001)),
    "050": item("drag-area", { source: "Test", dragArea: spread(0.01, 0.0005) }),
    "060": item("measured", {
      source: "Test",
      force: spread(3, 0.2),
      testTemperature: spread(293, 1),
      testPressure: spread(101000, 300),
      testSpeed: spread(30, 0.4),
      testDate: "2026-02-01",
    }),
    "070": fixed(spread(-1.5, 0.2), { saving: true }),
    "080": share(0.05, ["010", "040"], 0.01),
    "090": share(0.1, ["080", "060"], 0.02),
  },
  {
    point: AIR,
    finishes: {
      F10: { name: "Painted", roughness: spread(8e-6, 2e-6), source: "Test" },
      F20: { name: "Sanded", roughness: spread(4e-4, 1e-4), source: "Test" },
    },
  },
);

describe("sensitivities of the whole budget", () => {
  const model = modelOf(MIXED);
  const given = model.causes.filter(({ origin }) => origin !== "method").map((cause) => [cause.key, cause] as const);
  const result = uncertaintyOf(MIXED);

  it.each(given)("agree with central differences of the evaluation: %s", (key, { value, standardUncertainty }) => {
    const told = newtonsOf(result, key);
    const difference = centralDifference(MIXED, key, value, standardUncertainty);
    // What is too small a part of the variance is not told by name.
    if (told === 0) expect(Math.abs(difference / result.basic.standardUncertainty) ** 2).toBeLessThan(0.0011);
    else expectRelative(told, difference, 2e-5, key);
  });

  it("name every uncertain quantity once, whoever shares it", () => {
    expect(given.map(([key]) => key).sort()).toEqual(
      [
        ...["staticTemperature", "staticPressure", "speed"].map((field) => `operating_point:OP-1:${field}`),
        ...["F10", "F20"].map((number) => `finish:${number}:roughness`),
        ...["010", "020", "030"].flatMap((number) => [`item:${number}:length`, `item:${number}:breadth`]),
        ...["item:040:dragCoefficient", "item:040:referenceArea", "item:050:dragArea"],
        ...["force", "testTemperature", "testPressure", "testSpeed"].map((field) => `item:060:${field}`),
        ...["item:070:force", "item:080:fraction", "item:090:fraction"],
      ].sort(),
    );
  });
});

describe("what items share", () => {
  it("adds up as one cause: two like bodies are as uncertain together as twice one", () => {
    const one = uncertaintyOf(budget({ "010": body(1, null, { value: 0.05 }) }));
    const two = uncertaintyOf(budget({ "010": body(1, null, { value: 0.05 }), "020": body(1, null, { value: 0.05 }) }));
    expectRelative(two.basic.standardUncertainty, 2 * one.basic.standardUncertainty, 1e-9);
  });

  it("does not hold for their own inputs: two exact-stream forces add in squares", () => {
    const point = { fluid: "custom", density: { value: 1 }, dynamicViscosity: { value: 1e-5 }, speed: { value: 10 } };
    const state = budget({ "010": fixed(spread(3, 0.3)), "020": fixed(spread(4, 0.4)) }, { point });
    expectRelative(uncertaintyOf(state).basic.standardUncertainty, 0.5, 1e-9);
  });

  it("holds for a saving too, which takes away what it shares", () => {
    const dragArea = (value: number) => item("drag-area", { source: "Test", dragArea: { value }, saving: value < 0 });
    const state = budget({ "010": dragArea(0.05), "020": dragArea(-0.05) });
    expect(uncertaintyOf(state).basic.standardUncertainty).toBeLessThan(1e-9);
  });

  it("carries a length into the run-up of the plate behind: the two cancel where one layer runs on", () => {
    const behind = { liesBehind: "010", runUpFollows: true };
    const state = budget({
      "010": plate(spread(2, 0.1), { value: 1 }, 1),
      "020": plate({ value: 1 }, { value: 1 }, 1, behind),
    });
    // ∂/∂L₁ of F(L₁) + [F(L₁ + L₂) − F(L₁)] is that of F(L₁ + L₂): the one-fifth law of a plate of 3 m.
    const stream = streamStateOf({
      fluid: "custom",
      density: CUSTOM.density.value,
      dynamicViscosity: CUSTOM.dynamicViscosity.value,
      speed: CUSTOM.speed.value,
    });
    const reynolds = (stream.speed * 3) / stream.kinematicViscosity;
    const expected = 0.1 * 0.8 * stream.dynamicPressure * 0.074 * reynolds ** -0.2;
    expectRelative(newtonsOf(uncertaintyOf(state), "item:010:length"), expected, 1e-7);
  });
});

describe("a duct product", () => {
  const lossOf = (more: object) => item("loss-coefficient", { source: "Test", lossCoefficient: 0.5, ...more });
  const point = { fluid: "custom", density: { value: 1.2 }, dynamicViscosity: { value: 1.8e-5 }, speed: { value: 8 } };
  const q = 0.5 * 1.2 * 64;

  it("counts on its own flow area alone: an item's own section has no say in its pressure loss", () => {
    const state = budget(
      { "010": lossOf({ flowArea: spread(0.5, 0.1) }), "020": lossOf({}) },
      { kind: "duct", point, terms: { flowArea: spread(3, 0.06) } },
    );
    const result = uncertaintyOf(state);
    expectRelative(newtonsOf(result, "terms:TM:flowArea"), 2 * 0.5 * q * 0.06, 1e-9);
    expect(result.causes.map(({ key }) => key)).not.toContain("item:010:flowArea");
  });

  it("gives the walls of an entry the slope of their pressure loss, not of their friction", () => {
    const size = { width: spread(0.6, 0.01), height: spread(0.4, 0.01), length: spread(2, 0.02) };
    const line = { roughness: { value: 0 }, transition: "tripped", frictionLine: "one-fifth-law" };
    const duct = item("duct-entry", { ...size, ...line });
    const state = budget({ "010": duct }, { kind: "duct", point, terms: { flowArea: { value: 0.24 } } });
    const result = uncertaintyOf(state);
    // Δp = 2 (W + H) q F/(W H), so that W·∂Δp/∂W = −Δp·H/(W + H): a wider duct loses less.
    const basic = result.basic.value;
    expectRelative(newtonsOf(result, "item:010:width"), ((-basic * 0.4) / 0.6 / 1.0) * 0.01, 1e-8);
    expectRelative(newtonsOf(result, "item:010:height"), ((-basic * 0.6) / 0.4 / 1.0) * 0.01, 1e-8);
  });
});

describe("interval and probabilities", () => {
  const STILL = { fluid: "custom", density: { value: 1 }, dynamicViscosity: { value: 1e-5 }, speed: { value: 10 } };
  const exact = (newtons: number, u: number, more: object = {}) =>
    uncertaintyOf(budget({ "010": fixed(spread(newtons, u), more) }, { point: STILL, limitHundredths: 1000 }));

  it("are those of a normal distribution", () => {
    const { basic, predicted, basicExceedsLimit, predictedExceedsLimit } = exact(9, 0.5);
    expectRelative(basic.low95, 9 - 1.959963984540054 * 0.5, 1e-11);
    expectRelative(basic.high95, 9 + 1.959963984540054 * 0.5, 1e-11);
    // Two deviations below the limit: Φ(−2), Abramowitz & Stegun table 26.1.
    expectRelative(basicExceedsLimit, 0.022750131948179, 1e-10);
    // Growth of 20 % makes 10.8 N with u = 0.6 N: 0.8/0.6 deviations above, Φ(4/3) = 0.908788780274132.
    expectRelative(predicted.standardUncertainty, 0.6, 1e-11);
    expectRelative(predictedExceedsLimit, 0.908788780274132, 1e-9);
  });

  it("are certain where nothing is uncertain", () => {
    expect(exact(10, 0)).toMatchObject({ basicExceedsLimit: 0, predictedExceedsLimit: 1, causes: [] });
    expect(exact(10.01, 0).basicExceedsLimit).toBe(1);
  });

  it("let growth shrink what a saving takes away", () => {
    const { predicted } = exact(-5, 0.5, { saving: true });
    expectRelative(predicted.value, -4, 1e-11);
    expectRelative(predicted.standardUncertainty, 0.4, 1e-11);
  });

  it("are not given where an item has no result; it is named", () => {
    const state = budget({ "010": plate({ value: 1e-4 }, { value: 1 }, 1), "020": fixed(spread(1, 0.1)) });
    expect(budgetUncertainty(state, evaluateBudget(state), "OP-1")).toEqual({
      operatingPoint: "OP-1",
      refused: ["010"],
    });
  });
});

describe("the demo products", () => {
  it.each([sideFairing(), supplyDuct(), signPanel()])("have the forces of their results: $product.name", (state) => {
    for (const point of evaluateBudget(state).points) {
      const model = modelOf(state, point.operatingPoint);
      const stream = streamStateOf(model.stream.input);
      for (const each of model.items) {
        if (each.kind === "formula") expectRelative(each.force.newtons(stream), each.basic, 1e-11, each.item);
      }
    }
  });

  it("are uncertain by what their lines and methods bring, each once for all", () => {
    const state = sideFairing();
    const result = uncertaintyOf(state);
    const basics = new Map(evaluateBudget(state).points[0]?.items.map((each) => [each.item, each.basic]));
    const turbulent = ["010", "020", "030", "040", "050"].reduce((sum, number) => sum + (basics.get(number) ?? 0), 0);
    expectRelative(
      newtonsOf(result, "method:one-fifth-law"),
      turbulent * OWN_UNCERTAINTIES["one-fifth-law"].relative,
      1e-9,
    );
  });
});

describe("uncertainties beyond all measure", () => {
  const LINES = ["automatic", "one-fifth-law", "white", "ittc-1957", "momentum-integral", "fully-rough"];

  it.each(LINES)("give numbers or are refused in the draws, and break nothing off: %s", (frictionLine) => {
    const wild = (more: object) =>
      plate(spread(1, 50), spread(1, 50), 1, {
        roughness: spread(1e-5, 1e9),
        transition: "natural",
        frictionLine,
        ...more,
      });
    const state = budget({
      "010": wild({}),
      "020": wild({ runUp: spread(0, 1e9) }),
      "030": wild({ transition: "tripped", trippedAt: spread(0, 1e9) }),
      "040": wild({ roughness: spread(frictionLine === "fully-rough" ? 1e-9 : 0, 1e9) }),
    });
    const result = uncertaintyOf(state);
    expect(Number.isFinite(result.basic.standardUncertainty)).toBe(true);
    const model = modelOf(state);
    const draw = budgetDrawer(model);
    const stream = seededStream(4);
    for (let count = 0; count < 300; count += 1) expect(draw(stream).basic).toBeTypeOf("number");
  });
});
