/** Range of Re on the diameter in which each curve fit is meant. */
export const SPHERE_CURVE_RANGE = { min: 1e-2, max: 2e5 };
export const SCHILLER_NAUMANN_RANGE = { min: 1e-1, max: 800 };
export const CYLINDER_CURVE_RANGE = { min: 1, max: 2e5 };

/**
 * Drag coefficient of a sphere.
 *
 *   C_D = 24/Re + 6/(1 + √Re) + 0.4
 *
 * @param reynolds U D/ν [-], up to 2e5
 * @returns C_D on the frontal area [-]
 *
 * Source: F. M. White, Viscous Fluid Flow (from memory). Worked: Re = 1e4 gives 0.4618.
 */
export function sphereDragCoefficient(reynolds: number): number {
  return 24 / reynolds + 6 / (1 + Math.sqrt(reynolds)) + 0.4;
}

/**
 * Drag coefficient of a sphere at low Re (Schiller & Naumann).
 *
 *   C_D = (24/Re)(1 + 0.15 Re^0.687)
 *
 * @param reynolds U D/ν [-], up to about 800
 *
 * Source: Schiller & Naumann 1933 (from memory). Worked: Re = 100 gives 1.0917.
 */
export function schillerNaumannDragCoefficient(reynolds: number): number {
  return (24 / reynolds) * (1 + 0.15 * reynolds ** 0.687);
}

/**
 * Drag coefficient of a long circular cylinder across the stream.
 *
 *   C_D = 1 + 10 Re^(−2/3)
 *
 * @param reynolds U D/ν [-], 1 to 2e5
 *
 * Source: F. M. White, Viscous Fluid Flow (from memory). Worked: Re = 100 gives 1.4642.
 */
export function cylinderDragCoefficient(reynolds: number): number {
  return 1 + 10 * reynolds ** (-2 / 3);
}
