import { describe, expect, it } from "vitest";
import { FRICTION_LINE_NAMES } from "@/lib/aero/friction/friction-line-name";
import { MethodInput, StreamPointInput } from "@/lib/evaluation/document/schema";
import { evaluateMethod } from "@/lib/evaluation/methods/method-registry";
import { streamStateOf } from "@/lib/evaluation/methods/stream-state";
import { workedSteps } from "@/lib/evaluation/methods/worked-steps";
import { expectRelative } from "@/tests/support/relative";
import { PLAIN } from "./evaluate-one";

const STREAM = streamStateOf(StreamPointInput.parse(PLAIN));
const plate = (fields: object) => ({ method: "flat-plate-friction", length: 2, breadth: 0.7, faces: 2, ...fields });

function stepsOf(item: object) {
  const input = MethodInput.parse(item);
  const outcome = evaluateMethod(input.method, 1, input, STREAM);
  return { steps: workedSteps(input.method, 1, input, STREAM), outcome };
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

  it("states sources and ranges of the lines", () => {
    const { steps } = stepsOf(plate({ frictionLine: "white" }));
    const line = steps.find(({ symbol }) => symbol === "G_t");
    expect(line).toMatchObject({ source: "White, Viscous Fluid Flow, 3rd ed. 2006", range: "Re 5 × 10⁵ to 1 × 10¹⁰" });
  });

  it("are none for a refused item", () => {
    expect(stepsOf(plate({ length: 1e6 })).steps).toEqual([]);
  });
});
