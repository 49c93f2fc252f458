import type { Range } from "../range";

const MEAN = 1.328;

/** Below it the leading edge matters; above it a layer is rarely laminar. */
export const BLASIUS_RANGE: Range = { min: 1e3, max: 5e5 };

/** δ over θ and δ* over θ of the Blasius profile: 5.0, 1.7208 and 0.664 are δ, δ* and θ times √Re/x. */
export const BLASIUS_THICKNESS_RATIO = 5.0 / 0.664;
export const BLASIUS_SHAPE_FACTOR = 1.7208 / 0.664;

/**
 * Mean friction coefficient of one side of a laminar flat plate, times Re.
 *
 *   Re·C_F = 1.328 √Re
 *
 * @param reynolds Re = U x/ν [-], 1e3 to 5e5; 0 gives 0
 * @returns Re·C_F = F U/ν [-]
 *
 * Source: H. Blasius, Z. Math. Phys. 56 (1908); constant rounded as in H. Schlichting, Boundary-Layer Theory, 7th ed.
 * 1979, ch. VII (exact: 1.32822934). Worked: Re = 1e5 gives C_F = 0.0041995.
 */
export function blasiusFrictionIntegral(reynolds: number): number {
  return MEAN * Math.sqrt(reynolds);
}

/** Local coefficient 0.664/√Re of the same layer [-]; reynolds > 0. */
export function blasiusLocalCoefficient(reynolds: number): number {
  return MEAN / 2 / Math.sqrt(reynolds);
}
