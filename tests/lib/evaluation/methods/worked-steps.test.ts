import { describe, expect, it } from "vitest";
import { FRICTION_LINE_NAMES } from "@/lib/aero/friction/friction-line-name";
import { MethodInput, type StreamInput, StreamPointInput } from "@/lib/evaluation/document/schema";
import { evaluateMethod } from "@/lib/evaluation/methods/method-registry";
import { streamStateOf } from "@/lib/evaluation/methods/stream-state";
import { workedSteps } from "@/lib/evaluation/methods/worked-steps";
import { expectRelative } from "@/tests/support/relative";
import { PLAIN } from "./evaluate-one";

const POINT: StreamInput = StreamPointInput.parse(PLAIN);
const plate = (fields: object) => ({ method: "flat-plate-friction", length: 2, breadth: 0.7, faces: 2, ...fields });

function stepsOf(item: object, point = POINT) {
  const input = MethodInput.parse(item);
  const outcome = evaluateMethod(input.method, 1, input, streamStateOf(point));
  return { steps: workedSteps(input.method, 1, input, point), outcome };
}

/** A hand calculator: the text of a step with its values, read as arithmetic. */
function handCalculated(text: string): number {
  const expression = text
    .replace(/ × 10([⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+)/g, (_, power: string) => ` * 10 ** (${plainDigits(power)})`)
    .replaceAll("½", "0.5")
    .replaceAll("·", "*")
    .replaceAll("−", "-")
    .replaceAll("²", "**2")
    .replaceAll("e^(", "Math.exp(")
    .replaceAll("^", "**")
    .replaceAll("√(", "Math.sqrt(")
    .replace(/√([\d.e-]+)/g, "Math.sqrt($1)");
  if (!/^[\d.e*/+() \-Mathsqrtxp]+$/.test(expression)) return NaN;
  return Number(new Function(`return ${expression};`)());
}

function plainDigits(superscripts: string): string {
  return [...superscripts].map((digit) => (digit === "⁻" ? "-" : "⁰¹²³⁴⁵⁶⁷⁸⁹".indexOf(digit))).join("");
}

const PLATES: [string, object][] = [
  ...FRICTION_LINE_NAMES.flatMap((frictionLine): [string, object][] =>
    [{}, { transition: { kind: "tripped", at: 0 } }, { runUp: 0.8, formFactor: 1.1, localSpeedRatio: 1.2 }].map(
      (fields) => [`${frictionLine} ${JSON.stringify(fields)}`, plate({ frictionLine, roughness: 3e-4, ...fields })],
    ),
  ),
  ["automatic", plate({})],
  ["automatic, rough", plate({ roughness: 1e-3, runUp: 0.5 })],
  ["laminar", plate({ transition: { kind: "laminar" } })],
];
const FLUIDS: [StreamInput, string][] = [
  [{ fluid: "air", speed: 10, staticTemperature: 288.15, staticPressure: 101325 }, "ISO 2533:1975"],
  [{ fluid: "air", speed: 10, pressureAltitude: 2000 }, "ISO 2533:1975"],
  [{ fluid: "air", speed: 10, pressureAltitude: 14000 }, "ISO 2533:1975"],
  [{ fluid: "air", speed: 10, pressureAltitude: 2000, staticTemperature: 290 }, "ISO 2533:1975"],
  [{ fluid: "air", speed: 10, staticTemperature: 293.15, staticPressure: 101325, relativeHumidity: 0.5 }, "CIPM-2007"],
  [{ fluid: "fresh-water", speed: 2, staticTemperature: 298.15 }, "IAPWS SR6-08"],
  [{ fluid: "sea-water", speed: 2, staticTemperature: 278.15 }, "EOS-80"],
  [{ fluid: "sea-water", speed: 2, staticTemperature: 273.15 }, "Sharqawy"],
];
const OTHERS: [string, object][] = [
  ["duct", { method: "duct-entry", width: 0.5, height: 0.3, length: 1 }],
  ["loss", { method: "loss-coefficient", lossCoefficient: 0.4, flowArea: 3 }],
  [
    "body",
    { method: "bluff-body", dragCoefficient: 1.1, referenceArea: 0.5, shelterFactor: 0.7, localSpeedRatio: 1.1 },
  ],
  ["area", { method: "drag-area", dragArea: 0.3 }],
  ["measured", { method: "measured", force: 6.4, testPoint: { ...PLAIN, speed: 8 } }],
  ["fixed", { method: "fixed", force: 6.4 }],
];

describe("worked steps", () => {
  it.each([...PLATES, ...OTHERS])(
    "of %s end with the drag, each with a formula, its values and a unit",
    (_name, item) => {
      const { steps, outcome } = stepsOf(item);
      if (outcome.outcome === "refused") throw new Error("refused");
      expect(steps.at(-1)).toMatchObject({ symbol: "D", unit: "N", value: outcome.answer.drag });
      for (const step of steps) {
        expect(step.quantity.length * step.symbol.length * step.formula.length * step.unit.length).toBeGreaterThan(0);
        expect(Number.isFinite(step.value), step.symbol).toBe(true);
        expect(step.withValues, step.symbol).not.toMatch(/NaN|undefined/);
      }
    },
  );

  it.each([...PLATES, ...OTHERS])("of %s come to the same figures by hand", (_name, item) => {
    const { steps } = stepsOf(item);
    let repeated = 0;
    for (const step of steps) {
      // A step that states a mean line beside its product is checked by the product.
      const byHand = handCalculated(step.withValues.split(", ")[0] ?? "");
      if (Number.isNaN(byHand)) continue;
      repeated += 1;
      const lost = /−/.test(step.withValues) ? 1e-3 : 2e-5; // a difference loses digits of its six
      expectRelative(byHand, step.value, lost, `${step.symbol}: ${step.withValues}`);
    }
    expect(repeated).toBeGreaterThanOrEqual(Math.min(steps.length, 3));
  });

  it.each(FLUIDS)("of a plate in %o begin with its density and viscosity, by %s", (point, source) => {
    const stream = streamStateOf(point);
    const { steps } = stepsOf(plate({ length: 1 }), point);
    const last = (symbol: string) => steps.findLast((each) => each.symbol === symbol);
    expect(last("ρ")?.value).toBe(stream.density);
    expect(last("μ")?.value).toBe(stream.dynamicViscosity);
    expect(steps.some((each) => each.source?.includes(source))).toBe(true);
    const upToViscosity = steps.slice(0, steps.findIndex(({ symbol }) => symbol === "μ") + 1);
    for (const { symbol, withValues, value } of upToViscosity) {
      expectRelative(handCalculated(withValues), value, 2e-5, `${symbol}: ${withValues}`);
    }
  });

  it("of what takes no viscosity leave it out, and a fixed force needs no fluid", () => {
    const point: StreamInput = { fluid: "fresh-water", speed: 2, staticTemperature: 298.15 };
    const symbolsOf = (item: object) => stepsOf(item, point).steps.map(({ symbol }) => symbol);
    expect(symbolsOf({ method: "drag-area", dragArea: 0.3 })).toEqual(["α", "β", "ρ", "U", "q", "D"]);
    expect(symbolsOf({ method: "fixed", force: 6.4 })).toEqual(["D"]);
  });

  it("states sources and ranges of the lines", () => {
    const { steps } = stepsOf(plate({ frictionLine: "white" }));
    const line = steps.find(({ symbol }) => symbol === "G_t");
    expect(line).toMatchObject({ source: "White, Viscous Fluid Flow, 3rd ed. 2006", range: "Re 5 × 10⁵ to 1 × 10¹⁰" });
  });

  it("are none for a refused item", () => {
    expect(stepsOf(plate({ length: 1e6 })).steps).toEqual([]);
  });
});
