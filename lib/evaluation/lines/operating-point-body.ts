import { z } from "zod";
import type { FieldSpec } from "./field-spec";
import { FLUID_STATE_FIELDS, fluidStateFaults } from "./fluid-state";
import { FLUID_CHOICES, FLUIDS } from "./fluids";
import { humidityFaults } from "./humidity-faults";
import {
  coefficientUncertainty,
  fractionNumber,
  nonNegativeNumber,
  positiveQuantity,
  signedQuantity,
} from "./quantity";
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
    /** null: dry air. */
    relativeHumidity: fractionNumber.nullable().default(null),
    humidityUncertainty: coefficientUncertainty,
    speed: positiveQuantity,
    hoursPerYear: nonNegativeNumber.max(8784, "A year has at most 8784 hours.").nullable().default(null),
    /** null: the limit of the reference operating point. */
    limitHundredths: hundredths.min(1, "Must be greater than 0.").nullable().default(null),
  })
  .superRefine((body, context) => {
    for (const { field, sentence } of [...fluidStateFaults(body), ...humidityFaults(body)]) {
      context.addIssue({ code: "custom", path: [field], message: sentence });
    }
  });
export type OperatingPointBody = z.output<typeof OperatingPointBody>;

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
    key: "relativeHumidity",
    label: "Relative humidity",
    symbol: "h",
    help: "Leave it empty for dry air. Density by CIPM-2007, stated for 15 to 27 °C and 600 to 1100 hPa.",
    type: { type: "fraction" },
    optional: true,
    shownWhen: AIR_ONLY,
  },
  {
    key: "humidityUncertainty",
    label: "Standard uncertainty of the humidity",
    help: "As a fraction: 0.05 is five points of relative humidity.",
    type: { type: "number" },
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
  ...FLUID_STATE_FIELDS,
  "relativeHumidity",
  "humidityUncertainty",
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
    relativeHumidity: null,
    humidityUncertainty: null,
    speed: null,
    hoursPerYear: null,
    limitHundredths: null,
  };
}
