import { z } from "zod";

/** A number as it is given: bare, or with its standard uncertainty in the same unit. */
export type NumberInput = number | UncertainNumber;

export interface UncertainNumber {
  value: number;
  standardUncertainty: number;
}

export function numberOf(input: NumberInput): number {
  return typeof input === "number" ? input : input.value;
}

export function uncertaintyOf(input: NumberInput): number {
  return typeof input === "number" ? 0 : input.standardUncertainty;
}

/** A text that must stand there: an id, a name. */
export function textField() {
  return z
    .string({ error: (issue) => (issue.input === undefined ? "is required" : "must be a text") })
    .min(1, "must not be empty");
}

/** Message of a discriminated union: what was given is no object, or its kind is none of the known ones. */
export function oneOfMessage(names: readonly string[]): (issue: { input?: unknown }) => string {
  return ({ input }) =>
    typeof input === "object" && input !== null && !Array.isArray(input)
      ? `must be one of ${names.join(", ")}`
      : "must be an object";
}

/** What a number must be. `null` when it is so, else the sentence that follows the field's path. */
export type NumberRule = (value: number) => string | null;

const LARGEST = 1e12;
const SMALLEST_POSITIVE = 1e-12;

export const anyNumber: NumberRule = (value) => (Math.abs(value) > LARGEST ? "must be between -1e12 and 1e12" : null);

export const positive: NumberRule = (value) => {
  if (value <= 0) return "must be greater than 0";
  if (value < SMALLEST_POSITIVE) return "must be at least 1e-12";
  return anyNumber(value);
};

export const zeroOrGreater: NumberRule = (value) => (value < 0 ? "must be 0 or greater" : anyNumber(value));

export const fraction: NumberRule = (value) => (value < 0 || value > 1 ? "must be from 0 to 1" : null);

export const wholeFromOne: NumberRule = (value) =>
  value < 1 || !Number.isInteger(value) ? "must be a whole number of 1 or more" : anyNumber(value);

export function from(min: number, max: number, unit: string): NumberRule {
  return (value) => (value < min || value > max ? `must be from ${min} to ${max} ${unit}` : null);
}

/** A field that takes a number, bare or as {"value", "standardUncertainty"}; each fault stands at its own path. */
export function numberField(rule: NumberRule) {
  return z.custom<NumberInput>().superRefine((raw: unknown, context) => {
    for (const { path, message } of numberFaults(raw, rule)) context.addIssue({ code: "custom", path, message });
  });
}

interface NumberFault {
  path: string[];
  message: string;
}

function numberFaults(raw: unknown, rule: NumberRule): NumberFault[] {
  if (raw === undefined) return [{ path: [], message: "is required" }];
  if (typeof raw !== "object" || raw === null || Array.isArray(raw)) return plainFaults(raw, rule, []);

  const parts = new Map<string, unknown>(Object.entries(raw));
  const faults = [
    ...plainFaults(parts.get("value"), rule, ["value"]),
    ...plainFaults(parts.get("standardUncertainty"), zeroOrGreater, ["standardUncertainty"]),
  ];
  for (const key of parts.keys()) {
    if (key !== "value" && key !== "standardUncertainty") faults.push({ path: [key], message: "is not a field here" });
  }
  return faults;
}

function plainFaults(raw: unknown, rule: NumberRule, path: string[]): NumberFault[] {
  if (raw === undefined) return [{ path, message: "is required" }];
  if (typeof raw !== "number") return [{ path, message: "must be a number" }];
  if (!Number.isFinite(raw)) return [{ path, message: "must be a finite number" }];
  const message = rule(raw);
  return message === null ? [] : [{ path, message }];
}
