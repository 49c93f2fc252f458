import { dryAir } from "./dry-air";
import type { FluidState } from "./fluid-state";
import { humidAirDensity, vapourFraction } from "./humid-air-density";

/**
 * Moist air: density by CIPM-2007, viscosity and speed of sound from those of dry air.
 *
 *   μ by Sutherland,  a = a_dry √(ρ_dry/ρ)
 *
 * @param staticTemperature T [K]
 * @param staticPressure p [Pa]
 * @param relativeHumidity h [-], 0 to 1; less vapour than air, x_v ≤ 1
 * @returns ρ [kg/m³], μ [Pa s], a [m/s]
 * @throws RangeError where x_v exceeds 1: the vapour alone would press more than the whole
 *
 * Source: see humidAirDensity. That vapour leaves the viscosity alone is a judgement: saturated air of 15 to 27 °C is 0.2 to
 * 0.6 % less viscous, about the standard uncertainty of Sutherland's formula. The ratio of specific heats falls by 0.3 % at
 * most. Worked: 293.15 K, 101 325 Pa, h = 0.5 give 1.1993 kg/m³ where dry air has 1.2041.
 */
export function humidAir(staticTemperature: number, staticPressure: number, relativeHumidity: number): FluidState {
  const vapour = vapourFraction(staticTemperature, staticPressure, relativeHumidity);
  if (!(vapour <= 1)) throw new RangeError(`a mole fraction of vapour of ${vapour} is more than there is air`);
  const dry = dryAir(staticTemperature, staticPressure);
  const density = humidAirDensity(staticTemperature, staticPressure, relativeHumidity);
  return { ...dry, density, speedOfSound: (dry.speedOfSound ?? NaN) * Math.sqrt(dry.density / density) };
}
