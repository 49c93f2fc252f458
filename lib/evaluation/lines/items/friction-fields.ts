import { z } from "zod";
import { FRICTION_LINE_CHOICES, type FrictionLineChoice } from "@/lib/aero/friction/friction-line-name";
import { FRICTION_LINES } from "@/lib/aero/friction/friction-lines";
import type { Choice, FieldSpec } from "../field-spec";
import { nonNegativeQuantity, positiveNumber, roughnessQuantity, SMALLEST_POSITIVE } from "../quantity";
import { lineNumber } from "../text-schemas";

export function isFullyRough(line: FrictionLineChoice): boolean {
  return line === "fully-rough" || line === "fully-rough-mills-hang";
}

/** Surface, transition and line: the fields that every friction method shares. */
export const frictionShape = {
  finish: lineNumber.nullable().default(null),
  roughness: roughnessQuantity.nullable().default(null),
  transition: z.enum(["natural", "tripped", "laminar"], "Choose how the layer turns turbulent.").default("natural"),
  criticalReynolds: positiveNumber.default(500_000),
  trippedAt: nonNegativeQuantity.default({ value: 0 }),
  frictionLine: z.enum(FRICTION_LINE_CHOICES, "Choose a friction line.").default("automatic"),
};

export const newFriction = {
  finish: null,
  roughness: { value: 0 },
  transition: "natural",
  criticalReynolds: 500_000,
  trippedAt: { value: 0 },
  frictionLine: "automatic",
} as const;

/** A surface takes its roughness from the catalogue or states it: exactly one of the two. */
export function demandOneRoughness(
  body: { finish: string | null; roughness: { value: number } | null; frictionLine: FrictionLineChoice },
  context: { addIssue(issue: { code: "custom"; path: string[]; message: string }): void },
): void {
  const both = body.finish !== null && body.roughness !== null;
  const none = body.finish === null && body.roughness === null;
  if (!both && !none) {
    if (isFullyRough(body.frictionLine) && body.roughness && body.roughness.value < SMALLEST_POSITIVE) {
      const message = "A fully rough line needs a roughness greater than 0.";
      context.addIssue({ code: "custom", path: ["roughness"], message });
    }
    return;
  }

  const message = both
    ? "Choose a finish or type a roughness, not both."
    : "Choose a finish from the catalogue or type a roughness (0 for a smooth surface).";
  context.addIssue({ code: "custom", path: ["roughness"], message });
}

const TRANSITION_CHOICES: readonly Choice[] = [
  { value: "natural", label: "Natural", help: "Turbulent from the critical Reynolds number on." },
  { value: "tripped", label: "Tripped", help: "Turbulent from a stated place on; 0 means from the start." },
  {
    value: "laminar",
    label: "Held laminar",
    help: "Laminar to the end: needs evidence above the critical Reynolds number.",
  },
];

export const FRICTION_FIELDS: readonly FieldSpec[] = [
  {
    key: "finish",
    label: "Finish",
    help: "From the catalogue; leave it empty to type the roughness.",
    type: { type: "reference", to: "finish" },
    optional: true,
  },
  {
    key: "roughness",
    label: "Roughness",
    symbol: "k_s",
    help: "Equivalent sand-grain roughness: not the Ra of a surface tester.",
    type: { type: "quantity", dimension: "roughness" },
    optional: true,
    shownWhen: { field: "finish", is: [null] },
  },
  { key: "transition", label: "Transition", type: { type: "choice", choices: TRANSITION_CHOICES } },
  {
    key: "criticalReynolds",
    label: "Critical Reynolds number",
    symbol: "Re_tr",
    type: { type: "number" },
    shownWhen: { field: "transition", is: ["natural"] },
  },
  {
    key: "trippedAt",
    label: "Tripped at",
    symbol: "x_tr",
    help: "Measured from the start of the layer.",
    type: { type: "quantity", dimension: "length" },
    shownWhen: { field: "transition", is: ["tripped"] },
  },
  {
    key: "frictionLine",
    label: "Friction line",
    help: "Automatic judges smooth or rough at each operating point; a line by name is used as asked.",
    type: {
      type: "choice",
      choices: FRICTION_LINE_CHOICES.map((value) => ({
        value,
        label: value === "automatic" ? "Automatic" : FRICTION_LINES[value].title,
      })),
    },
  },
];
