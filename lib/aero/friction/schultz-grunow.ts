import { requireAbove } from "../require-above";
import { smoothLine } from "./smooth-line";

/**
 * Mean friction coefficient of a smooth plate (Schultz-Grunow).
 *
 *   C_F = 0.427/(log₁₀ Re − 0.407)^2.64
 *
 * @param reynolds Re = U x/ν [-], 1e6 to 1e9
 * @returns C_F of one side, on its wetted area [-]
 * @throws RangeError if Re ≤ 2.5527: there the formula has no value
 *
 * Source: F. Schultz-Grunow, Luftfahrtforschung 17 (1940) 239 (exponents from memory as given by Schlichting).
 * Worked: Re = 1e6 gives 0.0045357.
 */
export function schultzGrunowMean(reynolds: number): number {
  requireAbove(2.5527, reynolds, "Re");
  return 0.427 / (Math.log10(reynolds) - 0.407) ** 2.64;
}

/** Local coefficient dF/dx [-]; the printed 0.370 (log₁₀ Re)^−2.584 agrees within 0.15 %. */
export function schultzGrunowLocal(reynolds: number): number {
  return schultzGrunowMean(reynolds) * (1 - 2.64 / (Math.log(reynolds) - 0.407 * Math.LN10));
}

export const SCHULTZ_GRUNOW = smoothLine({
  name: "schultz-grunow",
  title: "Schultz-Grunow",
  formula: "C_F = 0.427/(log₁₀ Re − 0.407)^2.64",
  source: "Schultz-Grunow, Luftfahrtforschung 17 (1940) 239",
  reynoldsRange: { min: 1e6, max: 1e9 },
  profile: "none",
  mean: schultzGrunowMean,
  local: schultzGrunowLocal,
});
