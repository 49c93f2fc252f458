import { within } from "./range";

/** Re on the hydraulic diameter from which developed pipe flow is turbulent. */
export const COLEBROOK_RANGE = { min: 4000, max: 1e8 };
/** Greatest ε/D of the diagram that the equation is drawn in. */
export const COLEBROOK_ROUGHEST = 0.05;

/**
 * Darcy friction factor of fully developed turbulent flow (Colebrook), solved to machine precision.
 *
 *   1/√f = −2 log₁₀(ε/(3.7 D) + 2.51/(Re √f))
 *
 * @param reynolds Re_D = U D/ν on the hydraulic diameter [-], 4e3 to 1e8
 * @param relativeRoughness ε/D [-], 0 to 0.05
 * @returns f [-]
 * @throws RangeError outside these ranges, where the equation may have no root
 *
 * Source: C. Colebrook, J. Institution of Civil Engineers 11 (1939) 133–156. Standard uncertainty 5 % (judgement), more on a
 * rectangle. Worked: Re_D = 419 072, smooth: f = 0.013589.
 */
export function colebrookFriction(reynolds: number, relativeRoughness: number): number {
  if (!within(reynolds, COLEBROOK_RANGE) || !within(relativeRoughness, { min: 0, max: COLEBROOK_ROUGHEST })) {
    throw new RangeError(`Colebrook does not hold at Re ${reynolds}, ε/D ${relativeRoughness}`);
  }
  // s = 1/√f lies between 3 and 13; the residual rises and is concave in s, so that Newton rises to it from below.
  const slope = 2 / Math.LN10;
  let s = 3;
  let step = Infinity;
  while (Math.abs(step) > 1e-9 * s) {
    const inside = relativeRoughness / 3.7 + (2.51 * s) / reynolds;
    step = (s + slope * Math.log(inside)) / (1 + (slope * 2.51) / (reynolds * inside));
    s -= step;
  }
  return 1 / s ** 2;
}

/**
 * Wall friction of a duct in fully developed flow.
 *
 *   Δp = f (L/D) q,  drag = Δp · W H
 *
 * @returns drag [N]
 */
export function developedDuctDrag(
  frictionFactor: number,
  lengthOverDiameter: number,
  dynamicPressure: number,
  area: number,
): number {
  return frictionFactor * lengthOverDiameter * dynamicPressure * area;
}
