import { z } from "zod";
import type { FieldSpec } from "./field-spec";
import { FLUID_CHOICES, FLUIDS, type Fluid } from "./fluids";
import { nonNegativeNumber, positiveQuantity, signedQuantity } from "./quantity";
import { hundredths, requiredText } from "./text-schemas";

export const OperatingPointBody = z
  .strictObject({
    name: requiredText("Give the operating point a name.", 120),
    fluid: z.enum(FLUIDS, "Choose a fluid."),
    fluidVersion: z.int().positive().default(1),
    staticTemperature: positiveQuantity.nullable().default(null),
    staticPressure: positiveQuantity.nullable().default(null),
    pressureAltitude: signedQuantity.nullable().default(null),
    density: positiveQuantity.nullable().default(null),
    dynamicViscosity: positiveQuantity.nullable().default(null),
    speed: positiveQuantity,
    hoursPerYear: nonNegativeNumber.max(8784, "A year has at most 8784 hours.").nullable().default(null),
    /** null: the limit of the reference operating point. */
    limitHundredths: hundredths.min(1, "Must be greater than 0.").nullable().default(null),
  })
  .superRefine((body, context) => {
    for (const { path, message } of stateFaults(body)) context.addIssue({ code: "custom", path: [path], message });
  });
export type OperatingPointBody = z.output<typeof OperatingPointBody>;

const STATE_FIELDS = [
  "staticTemperature",
  "staticPressure",
  "pressureAltitude",
  "density",
  "dynamicViscosity",
] as const;
type StateField = (typeof STATE_FIELDS)[number];

const STATE_FIELDS_OF: Record<Fluid, readonly StateField[]> = {
  air: ["staticTemperature", "staticPressure", "pressureAltitude"],
  "fresh-water": ["staticTemperature"],
  "sea-water": ["staticTemperature"],
  custom: ["density", "dynamicViscosity"],
};

/** Admitted states, as the formulas of the fluids are stated for. */
const RANGES: Partial<Record<`${Fluid} ${StateField}`, { least: number; greatest: number; sentence: string }>> = {
  "air staticTemperature": {
    least: 150,
    greatest: 600,
    sentence: "Air is admitted from 150 to 600 K (−123.15 to 326.85 °C).",
  },
  "air staticPressure": { least: 5e3, greatest: 1e6, sentence: "Air is admitted from 5 × 10³ to 10⁶ Pa." },
  "air pressureAltitude": { least: -2000, greatest: 20000, sentence: "Admitted from −2 to 20 km." },
  "fresh-water staticTemperature": {
    least: 273.15,
    greatest: 373.15,
    sentence: "Fresh water is admitted from 273.15 to 373.15 K (0 to 100 °C).",
  },
  "sea-water staticTemperature": {
    least: 273.15,
    greatest: 313.15,
    sentence: "Sea water is admitted from 273.15 to 313.15 K (0 to 40 °C).",
  },
};

type State = { fluid: Fluid } & Record<StateField, { value: number } | null>;

function stateFaults(body: State): { path: StateField; message: string }[] {
  return STATE_FIELDS.flatMap((path) => {
    const quantity = body[path];
    if (quantity === null) return missing(body, path) ? [{ path, message: missingSentence(body.fluid, path) }] : [];
    if (!STATE_FIELDS_OF[body.fluid].includes(path)) {
      return [{ path, message: "Does not belong to this fluid: leave it empty." }];
    }
    if (path === "pressureAltitude" && body.staticPressure !== null) {
      return [{ path, message: "Give a pressure or an altitude, not both." }];
    }
    const range = RANGES[`${body.fluid} ${path}`];
    const outside = range && (quantity.value < range.least || quantity.value > range.greatest);
    return outside ? [{ path, message: range.sentence }] : [];
  });
}

function missing(body: State, path: StateField): boolean {
  if (!STATE_FIELDS_OF[body.fluid].includes(path) || path === "pressureAltitude") return false;
  if (body.fluid === "air" && body.pressureAltitude !== null) return false;
  return true;
}

function missingSentence(fluid: Fluid, path: StateField): string {
  return fluid === "air" && path === "staticPressure" ? "Give a pressure or an altitude." : "Needed for this fluid.";
}

const AIR_ONLY = { field: "fluid", is: ["air"] };
const CUSTOM_ONLY = { field: "fluid", is: ["custom"] };

export const OPERATING_POINT_FIELDS: readonly FieldSpec[] = [
  { key: "name", label: "Name", type: { type: "text", longest: 120 } },
  { key: "fluid", label: "Fluid", type: { type: "choice", choices: FLUID_CHOICES } },
  { key: "fluidVersion", label: "Version of its formulas", type: { type: "number", whole: true }, fixed: true },
  {
    key: "staticTemperature",
    label: "Static temperature",
    symbol: "T",
    help: "With an altitude it may stay empty: the standard atmosphere's then holds.",
    type: { type: "quantity", dimension: "temperature" },
    optional: true,
    shownWhen: { field: "fluid", is: ["air", "fresh-water", "sea-water"] },
  },
  {
    key: "staticPressure",
    label: "Static pressure",
    symbol: "p",
    help: "Absolute, not corrected to sea level.",
    type: { type: "quantity", dimension: "pressure" },
    optional: true,
    shownWhen: AIR_ONLY,
  },
  {
    key: "pressureAltitude",
    label: "Pressure altitude",
    symbol: "h",
    help: "In place of the pressure: height in the standard atmosphere.",
    type: { type: "quantity", dimension: "altitude" },
    optional: true,
    shownWhen: AIR_ONLY,
  },
  {
    key: "density",
    label: "Density",
    symbol: "ρ",
    type: { type: "quantity", dimension: "density" },
    optional: true,
    shownWhen: CUSTOM_ONLY,
  },
  {
    key: "dynamicViscosity",
    label: "Dynamic viscosity",
    symbol: "μ",
    type: { type: "quantity", dimension: "viscosity" },
    optional: true,
    shownWhen: CUSTOM_ONLY,
  },
  { key: "speed", label: "Speed", symbol: "U", type: { type: "quantity", dimension: "speed" } },
  {
    key: "hoursPerYear",
    label: "Hours a year",
    help: "For the energy a year of things that move.",
    type: { type: "number", unit: "h" },
    optional: true,
  },
  {
    key: "limitHundredths",
    label: "Limit",
    help: "Leave it empty to take the limit of the reference operating point.",
    type: { type: "newtons" },
    optional: true,
  },
];

/** The fields that make the stream: a change of one of them overtakes proposals drafted on the old state. */
export const OPERATING_POINT_STATE_FIELDS: readonly (keyof OperatingPointBody)[] = [
  "fluid",
  "fluidVersion",
  ...STATE_FIELDS,
  "speed",
];

export function newOperatingPoint() {
  return {
    name: "",
    fluid: "air" as const,
    fluidVersion: 1,
    staticTemperature: { value: 288.15, entered: "15 °C" },
    staticPressure: { value: 101325, entered: "1013.25 hPa" },
    pressureAltitude: null,
    density: null,
    dynamicViscosity: null,
    speed: null,
    hoursPerYear: null,
    limitHundredths: null,
  };
}
