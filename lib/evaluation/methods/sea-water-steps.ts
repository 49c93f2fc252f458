import { freshWaterViscosity } from "@/lib/aero/fluids/fresh-water";
import { seaWater, seaWaterDensityTerms, seaWaterViscosityTerms, STANDARD_SALINITY } from "@/lib/aero/fluids/sea-water";
import { FLUID_SOURCES } from "./fluid-sources";
import { freshWaterViscosityStep } from "./fresh-water-steps";
import { digits, step } from "./step-text";
import type { WorkedStep } from "./worked-step";

const DENSITY = { source: FLUID_SOURCES.seaWaterDensity };
const VISCOSITY = { source: FLUID_SOURCES.seaWaterViscosity };

/** From the temperature to density and viscosity of sea water at standard salinity. */
export function seaWaterSteps(temperature: number) {
  return { density: densitySteps(temperature), viscosity: viscositySteps(temperature) };
}

function densitySteps(temperature: number): WorkedStep[] {
  const t = celsius(temperature);
  const { pure, linear, power } = seaWaterDensityTerms(temperature);
  const salinity = STANDARD_SALINITY;
  return [
    step(
      ["Density of pure water", "ρ_w", "kg/m³"],
      "ρ_w = polynomial of fifth degree in t = T − 273.15 K",
      `999.842594 + 6.793952e-2 · ${t} − 9.09529e-3 · ${t}² + 1.001685e-4 · ${t}^3 − 1.120083e-6 · ${t}^4 + 6.536332e-9 · ${t}^5`,
      pure,
      DENSITY,
    ),
    step(
      ["Factor of the salinity", "A", "–"],
      "A = polynomial of fourth degree in t",
      `0.824493 − 4.0899e-3 · ${t} + 7.6438e-5 · ${t}² − 8.2467e-7 · ${t}^3 + 5.3875e-9 · ${t}^4`,
      linear,
      DENSITY,
    ),
    step(
      ["Factor of the salinity to the power of 1.5", "B", "–"],
      "B = polynomial of second degree in t",
      `−5.72466e-3 + 1.0227e-4 · ${t} − 1.6546e-6 · ${t}²`,
      power,
      DENSITY,
    ),
    step(
      ["Density", "ρ", "kg/m³"],
      "ρ = ρ_w + A S + B S^1.5 + C S²",
      `${pure.toPrecision(9)} + ${digits(linear)} · ${salinity} + ${digits(power)} · ${salinity}^1.5 + 4.8314e-4 · ${salinity}²`,
      seaWater(temperature).density,
      DENSITY,
    ),
  ];
}

function viscositySteps(temperature: number): WorkedStep[] {
  const t = celsius(temperature);
  const { linear, square } = seaWaterViscosityTerms(temperature);
  const salinity = STANDARD_SALINITY / 1000;
  return [
    freshWaterViscosityStep(temperature, "μ_w"),
    step(
      ["Factor of the salinity", "A_μ", "–"],
      "A_μ = 1.541 + 0.01998 t − 9.52 × 10⁻⁵ t²",
      `1.541 + 0.01998 · ${t} − 9.52e-5 · ${t}²`,
      linear,
      VISCOSITY,
    ),
    step(
      ["Factor of the squared salinity", "B_μ", "–"],
      "B_μ = 7.974 − 0.07561 t + 4.724 × 10⁻⁴ t²",
      `7.974 − 0.07561 · ${t} + 4.724e-4 · ${t}²`,
      square,
      VISCOSITY,
    ),
    step(
      ["Dynamic viscosity", "μ", "Pa·s"],
      "μ = μ_w (1 + A_μ S + B_μ S²), S in kg/kg",
      `${digits(freshWaterViscosity(temperature))} · (1 + ${digits(linear)} · ${salinity} + ${digits(square)} · ${salinity}²)`,
      seaWater(temperature).dynamicViscosity,
      VISCOSITY,
    ),
  ];
}

/** In brackets, because a temperature below zero would otherwise follow a sign. */
function celsius(temperature: number): string {
  return `(${digits(temperature)} − 273.15)`;
}
