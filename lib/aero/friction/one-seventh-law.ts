import { requireAbove } from "../require-above";
import { smoothLine } from "./smooth-line";

/**
 * Mean friction coefficient, one-seventh power law.
 *
 *   C_F = 0.031 Re^(−1/7)
 *
 * @param reynolds Re = U x/ν [-], 5e5 to 1e9 (range chosen here: the source gives no hard limits)
 * @returns C_F of one side, on its wetted area [-]
 * @throws RangeError if Re ≤ 0: there the formula has no value
 *
 * Source: F. M. White, Fluid Mechanics, sec. 7.4. Worked: Re = 1e7 gives 0.0031.
 */
export function oneSeventhMean(reynolds: number): number {
  requireAbove(0, reynolds, "Re");
  return 0.031 * reynolds ** (-1 / 7);
}

/** Local coefficient dF/dx = (6/7)·0.031 Re^(−1/7) [-]; printed as 0.027, which would integrate to 0.0315. */
export function oneSeventhLocal(reynolds: number): number {
  return (6 / 7) * oneSeventhMean(reynolds);
}

export const ONE_SEVENTH_LAW = smoothLine({
  name: "one-seventh-law",
  title: "One-seventh power law",
  formula: "C_F = 0.031 Re^(−1/7)",
  source: "White, Fluid Mechanics, sec. 7.4",
  reynoldsRange: { min: 5e5, max: 1e9 },
  profile: "one-seventh-power",
  mean: oneSeventhMean,
  local: oneSeventhLocal,
});
