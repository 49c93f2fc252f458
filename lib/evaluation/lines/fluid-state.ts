import type { Fluid } from "./fluids";

/** What tells the state of a fluid, by the fields of an operating point. */
export const FLUID_STATE_FIELDS = [
  "staticTemperature",
  "staticPressure",
  "pressureAltitude",
  "density",
  "dynamicViscosity",
] as const;
export type FluidStateField = (typeof FLUID_STATE_FIELDS)[number];

export type FluidState = { fluid: Fluid } & Record<FluidStateField, { value: number } | null>;

const FIELDS_OF: Record<Fluid, readonly FluidStateField[]> = {
  air: ["staticTemperature", "staticPressure", "pressureAltitude"],
  "fresh-water": ["staticTemperature"],
  "sea-water": ["staticTemperature"],
  custom: ["density", "dynamicViscosity"],
};

interface AdmittedRange {
  least: number;
  greatest: number;
  sentence: string;
}

/** The states that the fluids' formulas are stated for. */
const RANGES: Partial<Record<`${Fluid} ${FluidStateField}`, AdmittedRange>> = {
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

export interface FluidStateFault {
  field: FluidStateField;
  sentence: string;
}

/** What keeps a fluid's state from being one: a field missing, too many, or outside what is admitted. */
export function fluidStateFaults(state: FluidState): FluidStateFault[] {
  return FLUID_STATE_FIELDS.flatMap((field) => {
    const sentence = faultOf(state, field);
    return sentence === null ? [] : [{ field, sentence }];
  });
}

function faultOf(state: FluidState, field: FluidStateField): string | null {
  const quantity = state[field];
  if (quantity === null) return missingSentence(state, field);
  if (!FIELDS_OF[state.fluid].includes(field)) return "Does not belong to this fluid: leave it empty.";
  if (field === "pressureAltitude" && state.staticPressure !== null) return "Give a pressure or an altitude, not both.";

  const range = RANGES[`${state.fluid} ${field}`];
  const isOutside = range !== undefined && (quantity.value < range.least || quantity.value > range.greatest);
  return isOutside ? range.sentence : null;
}

function missingSentence(state: FluidState, field: FluidStateField): string | null {
  if (!FIELDS_OF[state.fluid].includes(field) || field === "pressureAltitude") return null;
  if (state.fluid !== "air") return "Needed for this fluid.";
  if (state.pressureAltitude !== null) return null;
  return field === "staticPressure" ? "Give a pressure or an altitude." : "Needed beside the pressure.";
}
