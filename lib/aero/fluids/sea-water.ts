import type { FluidState } from "./fluid-state";
import { freshWaterViscosity } from "./fresh-water";

const ZERO_CELSIUS = 273.15;
/** Practical salinity of standard sea water. */
export const STANDARD_SALINITY = 35;

/** Sea water at one atmosphere and salinity 35. @param temperature T [K], 273.15 to 313.15 */
export function seaWater(temperature: number): FluidState {
  return {
    density: seaWaterDensity(temperature, STANDARD_SALINITY),
    dynamicViscosity: seaWaterViscosity(temperature, STANDARD_SALINITY),
  };
}

/**
 * Density of sea water at one atmosphere.
 *
 *   ρ = ρ_w(t) + A(t) S + B(t) S^1.5 + C S²,  t in °C
 *
 * @param temperature T [K], 273.15 to 313.15
 * @param salinity S, practical salinity [-], 0 to 42
 * @returns ρ [kg/m³]
 *
 * Source: EOS-80, UNESCO technical papers in marine science 36 (1981), one-atmosphere equation after Millero & Poisson;
 * coefficients from memory, checked against the printed check values. Standard deviation 3.6e-3 kg/m³.
 * Worked: S = 35, 5 °C give 1027.67547 kg/m³.
 */
export function seaWaterDensity(temperature: number, salinity: number): number {
  const { pure, linear, power } = seaWaterDensityTerms(temperature);
  return pure + linear * salinity + power * salinity ** 1.5 + 4.8314e-4 * salinity ** 2;
}

/** ρ_w [kg/m³], A and B of the equation above. @param temperature T [K] */
export function seaWaterDensityTerms(temperature: number): { pure: number; linear: number; power: number } {
  const t = temperature - ZERO_CELSIUS;
  return {
    pure: 999.842594 + t * (6.793952e-2 + t * (-9.09529e-3 + t * (1.001685e-4 + t * (-1.120083e-6 + t * 6.536332e-9)))),
    linear: 8.24493e-1 + t * (-4.0899e-3 + t * (7.6438e-5 + t * (-8.2467e-7 + t * 5.3875e-9))),
    power: -5.72466e-3 + t * (1.0227e-4 - t * 1.6546e-6),
  };
}

/**
 * Dynamic viscosity of sea water.
 *
 *   μ = μ_w (1 + A S + B S²),  S in kg/kg
 *   A = 1.541 + 0.01998 t − 9.52e-5 t²,  B = 7.974 − 0.07561 t + 4.724e-4 t²
 *
 * @param temperature T [K], 273.15 to 313.15
 * @param salinity in g/kg [-], 0 to 150
 * @returns μ [Pa s]
 *
 * Source: Sharqawy, Lienhard, Zubair, Desalination and Water Treatment 16 (2010), μ_w by IAPWS SR6-08. Relative standard
 * uncertainty 1.5 %. Worked: S = 35, 15 °C give 1.2197e-3 Pa s.
 */
export function seaWaterViscosity(temperature: number, salinity: number): number {
  const { linear, square } = seaWaterViscosityTerms(temperature);
  const s = salinity / 1000;
  return freshWaterViscosity(temperature) * (1 + linear * s + square * s ** 2);
}

/** A and B of the viscosity's equation [-]. @param temperature T [K] */
export function seaWaterViscosityTerms(temperature: number): { linear: number; square: number } {
  const t = temperature - ZERO_CELSIUS;
  return { linear: 1.541 + 0.01998 * t - 9.52e-5 * t ** 2, square: 7.974 - 0.07561 * t + 4.724e-4 * t ** 2 };
}
