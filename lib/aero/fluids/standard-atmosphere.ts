import { AIR_GAS_CONSTANT } from "./dry-air";

const SEA_LEVEL_TEMPERATURE = 288.15;
const SEA_LEVEL_PRESSURE = 101325;
const LAPSE_RATE = 0.0065;
const GRAVITY = 9.80665;
const TROPOPAUSE = 11000;
const EARTH_RADIUS = 6356766;

/**
 * Temperature and pressure of the standard atmosphere.
 *
 *   to 11 km:  T = T₀ − L H,  p = p₀ (T/T₀)^(g₀/(R L))
 *   above:     T = T₁₁,       p = p₁₁ exp(−g₀ (H − 11 km)/(R T₁₁))
 *
 * @param altitude H, geopotential [m], −2000 to 20000
 * @returns staticTemperature [K], staticPressure [Pa]
 *
 * Source: ISO 2533:1975. Worked: 2000 m gives 275.15 K and 79 495 Pa.
 */
export function standardAtmosphere(altitude: number): { staticTemperature: number; staticPressure: number } {
  const staticTemperature = SEA_LEVEL_TEMPERATURE - LAPSE_RATE * Math.min(altitude, TROPOPAUSE);
  const exponent = GRAVITY / (AIR_GAS_CONSTANT * LAPSE_RATE);
  const lower = SEA_LEVEL_PRESSURE * (staticTemperature / SEA_LEVEL_TEMPERATURE) ** exponent;
  if (altitude <= TROPOPAUSE) return { staticTemperature, staticPressure: lower };
  const decay = (GRAVITY * (altitude - TROPOPAUSE)) / (AIR_GAS_CONSTANT * staticTemperature);
  return { staticTemperature, staticPressure: lower * Math.exp(-decay) };
}

/**
 * Geopotential altitude of a geometric one.
 *
 *   H = r h/(r + h),  r = 6 356 766 m
 *
 * @param geometricAltitude h [m]
 * @returns H [m]
 *
 * Source: ISO 2533:1975. Worked: 11 000 m gives 10 981 m.
 */
export function geopotentialAltitude(geometricAltitude: number): number {
  return (EARTH_RADIUS * geometricAltitude) / (EARTH_RADIUS + geometricAltitude);
}
