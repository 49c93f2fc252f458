import { requireAbove } from "../require-above";
import { smoothLine } from "./smooth-line";

const CONSTANT = 0.242;

/**
 * Mean friction coefficient of a smooth plate (Kármán–Schoenherr), solved to machine precision.
 *
 *   0.242/√C_F = log₁₀(Re·C_F)
 *
 * With w = ln(Re·C_F) it reads 0.242 ln 10 √Re e^(−w/2) = w, whose left side falls and is convex: Newton from the left
 * rises to the root without overshooting.
 *
 * @param reynolds Re = U x/ν [-], 1e5 to 1e10
 * @returns C_F of one side, on its wetted area [-]
 * @throws RangeError if Re ≤ 0: there the formula has no value
 *
 * Source: K. E. Schoenherr, Trans. SNAME 40 (1932). The printed form 1/√C_F = 4.13 log₁₀(Re·C_F) differs by 0.09 %.
 * Worked: Re = 1e7 gives 0.0029343.
 */
export function karmanSchoenherrMean(reynolds: number): number {
  requireAbove(0, reynolds, "Re");
  const scale = CONSTANT * Math.LN10 * Math.sqrt(reynolds);
  let w = 1;
  let step = Infinity;
  // Newton doubles the digits: a step below 1e-9 leaves an error below the last digit.
  while (Math.abs(step) > 1e-9 * w) {
    const left = scale * Math.exp(-w / 2);
    step = (left - w) / (left / 2 + 1);
    w += step;
  }
  return ((CONSTANT * Math.LN10) / w) ** 2;
}

/** Local coefficient dF/dx = 0.242 C_F/(0.242 + 2 √C_F/ln 10) [-], by differentiating the implicit line. */
export function karmanSchoenherrLocal(reynolds: number): number {
  const mean = karmanSchoenherrMean(reynolds);
  return (CONSTANT * mean) / (CONSTANT + (2 * Math.sqrt(mean)) / Math.LN10);
}

export const KARMAN_SCHOENHERR = smoothLine({
  name: "karman-schoenherr",
  title: "Kármán–Schoenherr",
  formula: "0.242/√C_F = log₁₀(Re·C_F)",
  source: "Schoenherr, Trans. SNAME 40 (1932)",
  reynoldsRange: { min: 1e5, max: 1e10 },
  profile: "none",
  mean: karmanSchoenherrMean,
  local: karmanSchoenherrLocal,
});
