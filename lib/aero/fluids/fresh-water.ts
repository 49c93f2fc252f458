import type { FluidState } from "./fluid-state";

const GAS_CONSTANT = 461.51805;
const REFERENCE_TEMPERATURE = 10;
const REFERENCE_PRESSURE = 1e5;
/** a₅ of the specific volume, and the factors and powers of its α and β. */
export const FRESH_WATER_VOLUME_CONSTANT = 1.93763157e-2;
export const FRESH_WATER_ALPHA_TERMS = [
  [6.74458446e3, 4],
  [-2.22521604e5, 5],
  [1.00231247e8, 7],
  [-1.63552118e9, 8],
  [8.32299658e9, 9],
] as const;
export const FRESH_WATER_BETA_TERMS = [
  [5.78545292e-3, 1],
  [-1.53195665e-2, 2],
  [3.11337859e-2, 3],
  [-4.23546241e-2, 4],
  [3.38713507e-2, 5],
  [-1.19946761e-2, 6],
] as const;
/** Factors and powers of T/300 K. */
export const FRESH_WATER_VISCOSITY_TERMS = [
  [280.68, -1.9],
  [511.45, -7.7],
  [61.131, -19.6],
  [0.45903, -40],
] as const;

/** Liquid water at 0.1 MPa: density and viscosity by IAPWS SR6-08. @param temperature T [K], 273.15 to 373.15 */
export function freshWater(temperature: number): FluidState {
  return { density: freshWaterDensity(temperature), dynamicViscosity: freshWaterViscosity(temperature) };
}

/**
 * Density of liquid water at 0.1 MPa.
 *
 *   v = (R T_r/p₀) [a₅ + Σ aᵢ α^nᵢ + Σ bᵢ β^mᵢ],  α = T_r/(593 K − T),  β = T_r/(T − 232 K)
 *
 * @param temperature T [K], 273.15 to 373.15 (above 372.76 K the liquid is metastable at this pressure)
 * @returns ρ = 1/v [kg/m³]
 *
 * Source: IAPWS SR6-08(2011), eq. (2). Relative standard uncertainty about 1e-6 near room temperature.
 * Worked: 298.15 K gives 997.047 kg/m³.
 */
export function freshWaterDensity(temperature: number): number {
  const alpha = REFERENCE_TEMPERATURE / (593 - temperature);
  const beta = REFERENCE_TEMPERATURE / (temperature - 232);
  let sum: number = FRESH_WATER_VOLUME_CONSTANT;
  for (const [a, n] of FRESH_WATER_ALPHA_TERMS) sum += a * alpha ** n;
  for (const [b, m] of FRESH_WATER_BETA_TERMS) sum += b * beta ** m;
  return REFERENCE_PRESSURE / (GAS_CONSTANT * REFERENCE_TEMPERATURE * sum);
}

/**
 * Dynamic viscosity of liquid water at 0.1 MPa.
 *
 *   μ = 1e-6 Σ aᵢ (T/300 K)^bᵢ
 *
 * @param temperature T [K], 273.15 to 373.15
 * @returns μ [Pa s]
 *
 * Source: IAPWS SR6-08(2011), eq. (7) (number from memory). Relative standard uncertainty 1 %.
 * Worked: 298.15 K gives 890.0e-6 Pa s.
 */
export function freshWaterViscosity(temperature: number): number {
  let sum = 0;
  for (const [a, b] of FRESH_WATER_VISCOSITY_TERMS) sum += a * (temperature / 300) ** b;
  return 1e-6 * sum;
}
