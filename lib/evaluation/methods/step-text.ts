import { formatSignificant } from "@/lib/units/format-number";
import type { WorkedStep } from "./worked-step";

/** A number in a worked step: six significant digits, so that a hand calculator comes to the same figure. */
export function digits(value: number): string {
  if (value === 0) return "0";
  const size = Math.abs(value);
  // In brackets, so that a division by it is read as one.
  if (size >= 1e6 || size < 1e-3) return `(${formatSignificant(value, 6)})`;
  return String(Number(value.toPrecision(6)));
}

/** One term of a printed sum with its sign: "− 0.0153195665 · (0.15)²". */
export function signedTerm(factor: number, of: string): string {
  return `${factor < 0 ? "−" : "+"} ${String(Math.abs(factor))} · ${of}`;
}

type StepExtras = Pick<WorkedStep, "source" | "range">;

/** `quantity|symbol|unit`, the equation in symbols, with its values, and what it gives. */
export function step(
  [quantity, symbol, unit]: readonly [string, string, string],
  formula: string,
  withValues: string,
  value: number,
  extras: StepExtras = {},
): WorkedStep {
  return { quantity, symbol, formula, withValues, value, unit, ...extras };
}

/** Local speed and dynamic pressure, with which every method of a moving stream begins. */
export function streamSteps(stream: { speed: number; density: number }, ratio: number): WorkedStep[] {
  const speed = stream.speed * ratio;
  return [
    step(
      ["Local speed", "U", "m/s"],
      "U = speed · local speed ratio",
      `${digits(stream.speed)} · ${digits(ratio)}`,
      speed,
    ),
    step(
      ["Dynamic pressure", "q", "Pa"],
      "q = ½ ρ U²",
      `½ · ${digits(stream.density)} · ${digits(speed)}²`,
      0.5 * stream.density * speed ** 2,
    ),
  ];
}
