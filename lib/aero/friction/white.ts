import { requireAbove } from "../require-above";
import { smoothLine } from "./smooth-line";

/**
 * Mean friction coefficient of a smooth plate (White).
 *
 *   C_F = 0.523/ln²(0.06 Re)
 *
 * @param reynolds Re = U x/ν [-], 5e5 to 1e10 (range chosen here)
 * @returns C_F of one side, on its wetted area [-]
 * @throws RangeError if Re ≤ 16.667: there the formula has no value
 *
 * Source: F. M. White, Viscous Fluid Flow, 3rd ed. 2006, flat-plate section. It lies 4.4 % below the integral of his local
 * 0.455/ln²(0.06 Re) at Re = 1e7. Worked: Re = 5e5 gives 0.0049212.
 */
export function whiteMean(reynolds: number): number {
  requireAbove(16.667, reynolds, "Re");
  return 0.523 / Math.log(0.06 * reynolds) ** 2;
}

/** Local coefficient dF/dx = C_F (1 − 2/ln(0.06 Re)) [-]; the printed local form is a different fit. */
export function whiteLocal(reynolds: number): number {
  return whiteMean(reynolds) * (1 - 2 / Math.log(0.06 * reynolds));
}

export const WHITE = smoothLine({
  name: "white",
  title: "White",
  formula: "C_F = 0.523/ln²(0.06 Re)",
  source: "White, Viscous Fluid Flow, 3rd ed. 2006",
  reynoldsRange: { min: 5e5, max: 1e10 },
  profile: "none",
  mean: whiteMean,
  local: whiteLocal,
});
