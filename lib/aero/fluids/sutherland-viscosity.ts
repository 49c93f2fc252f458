const BETA = 1.458e-6;
const SUTHERLAND_TEMPERATURE = 110.4;

/**
 * Dynamic viscosity of air (Sutherland).
 *
 *   μ = β T^1.5/(T + S),  β = 1.458e-6 kg/(m s K^0.5),  S = 110.4 K
 *
 * @param temperature T [K], 150 to 600
 * @returns μ [Pa s]
 *
 * Source: ISO 2533:1975; U.S. Standard Atmosphere 1976. Other printed sets of constants differ by less than 0.05 %.
 * Relative standard uncertainty 0.5 % (judgement).
 * Worked: 288.15 K gives 1.7894e-5 Pa s.
 */
export function sutherlandViscosity(temperature: number): number {
  return (BETA * temperature ** 1.5) / (temperature + SUTHERLAND_TEMPERATURE);
}
