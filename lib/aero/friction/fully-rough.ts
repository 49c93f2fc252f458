import { requireAbove } from "../require-above";
import { roughLine } from "./rough-line";

/**
 * Mean friction coefficient of a fully rough plate (Prandtl–Schlichting).
 *
 *   C_F = (1.89 + 1.62 log₁₀(x/k_s))^−2.5
 *
 * @param lengthOverRoughness x/k_s [-], 1e2 to 1e6
 * @returns C_F of one side, on its wetted area [-]
 * @throws RangeError if x/k_s ≤ 0.0682: there the formula has no value
 *
 * Source: Prandtl & Schlichting 1934; H. Schlichting, Boundary-Layer Theory, 7th ed. 1979, ch. XXI.
 * Worked: x/k_s = 1e4 gives 0.0049339.
 */
export function fullyRoughMean(lengthOverRoughness: number): number {
  requireAbove(0.0682, lengthOverRoughness, "x/k_s");
  return (1.89 + 1.62 * Math.log10(lengthOverRoughness)) ** -2.5;
}

/** Local coefficient dF/dx [-], the derivative of the mean line; the printed local form differs by 0.2 to 1 %. */
export function fullyRoughLocal(lengthOverRoughness: number): number {
  const base = 1.89 + 1.62 * Math.log10(lengthOverRoughness);
  return base ** -2.5 * (1 - (2.5 * 1.62) / (Math.LN10 * base));
}

export const FULLY_ROUGH = roughLine({
  name: "fully-rough",
  title: "Schlichting, fully rough",
  formula: "C_F = (1.89 + 1.62 log₁₀(x/k_s))^−2.5",
  source: "Prandtl & Schlichting 1934; Schlichting, Boundary-Layer Theory, 7th ed. 1979, ch. XXI",
  reynoldsRange: { min: 1e3, max: 1e10 },
  lengthOverRoughnessRange: { min: 1e2, max: 1e6 },
  mean: fullyRoughMean,
  local: fullyRoughLocal,
});
