import type { Range } from "../range";

const ZERO_CELSIUS = 273.15;

/** Where CIPM-2007 is stated: T [K] and p [Pa]. */
export const CIPM_TEMPERATURES: Range = { min: 288.15, max: 300.15 };
export const CIPM_PRESSURES: Range = { min: 6e4, max: 1.1e5 };

/**
 * Density of moist air (CIPM-2007).
 *
 *   ρ = [3.483740 + 1.4446 (x_CO₂ − 0.0004)]·10⁻³ · p/(Z T) · (1 − 0.3780 x_v),  x_v = h f(p, t) p_sv(T)/p
 *
 * @param staticTemperature T [K], 288.15 to 300.15
 * @param staticPressure p [Pa], 6e4 to 1.1e5
 * @param relativeHumidity h [-], 0 to 1
 * @param carbonDioxide mole fraction [-]
 * @returns ρ [kg/m³]
 *
 * Source: Picard, Davis, Gläser, Fujii, Metrologia 45 (2008) 149–155; coefficients from memory, checked against an ideal
 * mixture (0.2 %). Relative standard uncertainty of the formula 2.2e-5.
 * Worked: 293.15 K, 101 325 Pa, h = 0.5, x = 0.0004 give 1.1993 kg/m³.
 */
export function humidAirDensity(
  staticTemperature: number,
  staticPressure: number,
  relativeHumidity: number,
  carbonDioxide = 0.0004,
): number {
  const vapour = vapourFraction(staticTemperature, staticPressure, relativeHumidity);
  const ratio = (3.48374 + 1.4446 * (carbonDioxide - 0.0004)) * 1e-3;
  const compressibility = compressibilityFactor(staticTemperature, staticPressure, vapour);
  return ((ratio * staticPressure) / (compressibility * staticTemperature)) * (1 - 0.378 * vapour);
}

/** x_v = h f(p, t) p_sv(T)/p, mole fraction of vapour [-]; CIPM-2007, A1.3. */
export function vapourFraction(temperature: number, pressure: number, relativeHumidity: number): number {
  return (
    (relativeHumidity * enhancementFactor(temperature, pressure) * saturationVapourPressure(temperature)) / pressure
  );
}

/** p_sv(T) = exp(A T² + B T + C + D/T) [Pa], T in K; CIPM-2007, A1.1. */
export function saturationVapourPressure(temperature: number): number {
  return Math.exp(
    1.2378847e-5 * temperature ** 2 - 1.9121316e-2 * temperature + 33.93711047 - 6.3431645e3 / temperature,
  );
}

/** f = α + β p + γ t² [-], t in °C; CIPM-2007, A1.2. */
export function enhancementFactor(temperature: number, pressure: number): number {
  return 1.00062 + 3.14e-8 * pressure + 5.6e-7 * (temperature - ZERO_CELSIUS) ** 2;
}

/** Z [-] of moist air with vapour mole fraction x_v; CIPM-2007, A1.4. */
export function compressibilityFactor(temperature: number, pressure: number, vapour: number): number {
  const t = temperature - ZERO_CELSIUS;
  const ratio = pressure / temperature;
  const first =
    1.58123e-6 -
    2.9331e-8 * t +
    1.1043e-10 * t ** 2 +
    (5.707e-6 - 2.051e-8 * t) * vapour +
    (1.9898e-4 - 2.376e-6 * t) * vapour ** 2;
  return 1 - ratio * first + ratio ** 2 * (1.83e-11 - 0.765e-8 * vapour ** 2);
}
