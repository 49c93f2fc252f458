/** Re on the hydraulic diameter from which developed pipe flow is turbulent. */
export const COLEBROOK_RANGE = { min: 4000, max: 1e8 };

/**
 * Darcy friction factor of fully developed turbulent flow (Colebrook), solved to machine precision.
 *
 *   1/√f = −2 log₁₀(ε/(3.7 D) + 2.51/(Re √f))
 *
 * @param reynolds Re_D = U D/ν on the hydraulic diameter [-], 4e3 to 1e8
 * @param relativeRoughness ε/D [-], 0 to 0.05
 * @returns f [-]
 *
 * Source: C. Colebrook, J. Institution of Civil Engineers 11 (1939) 133–156. Standard uncertainty 5 % (judgement), more on a
 * rectangle. Worked: Re_D = 419 072, smooth: f = 0.013589.
 */
export function colebrookFriction(reynolds: number, relativeRoughness: number): number {
  const slope = 2 / Math.LN10;
  // s = 1/√f; the right side falls slowly with s, so that Newton converges from any start.
  let s = 6;
  for (let step = Infinity; Math.abs(step) > 1e-10 * s;) {
    const inside = relativeRoughness / 3.7 + (2.51 * s) / reynolds;
    step = (s + slope * Math.log(inside)) / (1 + (slope * 2.51) / (reynolds * inside));
    s = Math.max(s - step, s / 2);
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
