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

/**
 * The same law with the constants that the momentum integral gives, not adjusted to tests.
 *
 *   C_F = 0.072 Re^(−1/5),  c_f = dF/dx = 0.0576 Re^(−1/5)
 *
 * @param reynolds Re = U x/ν [-], 5e5 to 1e7
 * @returns C_F of one side, on its wetted area [-]
 * @throws RangeError if Re ≤ 0: there the formula has no value
 *
 * Source: Th. von Kármán and L. Prandtl 1921, one-seventh profile with τ/(ρU²) = 0.0225 (ν/(U δ))^(1/4); Schlichting,
 * Boundary-Layer Theory, 7th ed. 1979, ch. XXI. One set with θ 0.036, δ* 0.0463
 * and δ 0.371, each over x and times Re^(1/5).
 * Worked: Re = 1e6 gives 0.0045429.
 */
export function oneFifthMeanByIntegral(reynolds: number): number {
  requireAbove(0, reynolds, "Re");
  return 0.072 * reynolds ** -0.2;
}

/** Local coefficient 0.0576 Re^(−1/5) [-], the exact derivative of the mean law and printed so. */
export function oneFifthLocalByIntegral(reynolds: number): number {
  return 0.0576 * reynolds ** -0.2;
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

/** Takes the place of the adjusted one where a method's version says so: it is asked for by the same name. */
export const ONE_FIFTH_LAW_BY_INTEGRAL = smoothLine({
  name: "one-fifth-law",
  title: "One-fifth power law by the momentum integral",
  formula: "C_F = 0.072 Re^(−1/5)",
  source: "von Kármán 1921, Prandtl 1921; Schlichting, Boundary-Layer Theory, 7th ed. 1979, ch. XXI",
  reynoldsRange: { min: 5e5, max: 1e7 },
  profile: "one-seventh-power",
  mean: oneFifthMeanByIntegral,
  local: oneFifthLocalByIntegral,
});
