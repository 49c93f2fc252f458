import type { FluidState } from "./fluid-state";
import { sutherlandViscosity } from "./sutherland-viscosity";

/** R of dry air, J/(kg K). */
export const AIR_GAS_CONSTANT = 287.05287;
const RATIO_OF_SPECIFIC_HEATS = 1.4;

/**
 * Dry air as a perfect gas.
 *
 *   ρ = p/(R T),  a = √(γ R T),  μ by Sutherland
 *
 * @param staticTemperature T [K], 150 to 600
 * @param staticPressure p [Pa], 5e3 to 1e6
 * @returns ρ [kg/m³], μ [Pa s], a [m/s]
 *
 * Source: ISO 2533:1975 (R = 287.05287 J/(kg K), γ = 1.4). Relative standard
 * uncertainty of the density 0.3 % (judgement: moist air is up to 0.5 % lighter).
 * Worked: 288.15 K, 101 325 Pa give ρ = 1.2250 kg/m³, a = 340.294 m/s.
 */
export function dryAir(staticTemperature: number, staticPressure: number): FluidState {
  return {
    density: staticPressure / (AIR_GAS_CONSTANT * staticTemperature),
    dynamicViscosity: sutherlandViscosity(staticTemperature),
    speedOfSound: Math.sqrt(RATIO_OF_SPECIFIC_HEATS * AIR_GAS_CONSTANT * staticTemperature),
  };
}
