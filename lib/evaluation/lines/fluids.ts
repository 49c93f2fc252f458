import type { Choice } from "./field-spec";

export const FLUIDS = ["air", "fresh-water", "sea-water", "custom"] as const;
export type Fluid = (typeof FLUIDS)[number];

export const FLUID_CHOICES: readonly Choice[] = [
  { value: "air", label: "Air", help: "Ideal gas with Sutherland's viscosity." },
  { value: "fresh-water", label: "Fresh water" },
  { value: "sea-water", label: "Sea water", help: "At a salinity of 35." },
  { value: "custom", label: "Custom", help: "Density and viscosity as typed." },
];
