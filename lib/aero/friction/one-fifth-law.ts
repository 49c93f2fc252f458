import { requireAbove } from "../require-above";
import { smoothLine } from "./smooth-line";

/**
 * Mean friction coefficient, one-fifth power law.
 *
 *   C_F = 0.074 Re^(−1/5)
 *
 * @param reynolds Re = U x/ν [-], 5e5 to 1e7
 * @returns C_F of one side, on its wetted area [-]
 * @throws RangeError if Re ≤ 0: there the formula has no value
 *
 * Source: L. Prandtl 1927; H. Schlichting, Boundary-Layer Theory, 7th ed. 1979, ch. XXI. The momentum integral gives 0.072;
 * 0.074 is adjusted to tests. Worked: Re = 1e6 gives 0.0046691.
 */
export function oneFifthMean(reynolds: number): number {
  requireAbove(0, reynolds, "Re");
  return 0.074 * reynolds ** -0.2;
}

/** Local coefficient dF/dx = 0.0592 Re^(−1/5) [-], the exact derivative of the mean law and printed so. */
export function oneFifthLocal(reynolds: number): number {
  return 0.0592 * reynolds ** -0.2;
}

export const ONE_FIFTH_LAW = smoothLine({
  name: "one-fifth-law",
  title: "One-fifth power law",
  formula: "C_F = 0.074 Re^(−1/5)",
  source: "Prandtl 1927; Schlichting, Boundary-Layer Theory, 7th ed. 1979, ch. XXI",
  reynoldsRange: { min: 5e5, max: 1e7 },
  profile: "one-seventh-power",
  mean: oneFifthMean,
  local: oneFifthLocal,
});
