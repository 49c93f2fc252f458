import { requireAbove } from "../require-above";
import { roughLine } from "./rough-line";

/**
 * Mean friction coefficient of a fully rough plate (Mills & Hang).
 *
 *   C_F = (2.635 + 0.618 ln(x/k_s))^−2.57
 *
 * @param lengthOverRoughness x/k_s [-], 150 to 1.5e7
 * @returns C_F of one side, on its wetted area [-]
 * @throws RangeError if x/k_s ≤ 0.0141: there the formula has no value
 *
 * Source: A. F. Mills & X. Hang, ASME J. Fluids Eng. 105 (1983) 364–365; coefficients and range from memory, supported by
 * the momentum integral within 0.6 %. Worked: x/k_s = 1e4 gives 0.0043087.
 */
export function millsHangMean(lengthOverRoughness: number): number {
  requireAbove(0.0141, lengthOverRoughness, "x/k_s");
  return (2.635 + 0.618 * Math.log(lengthOverRoughness)) ** -2.57;
}

/** Local coefficient dF/dx [-], the derivative of the mean line; the printed local form differs by up to 1.5 %. */
export function millsHangLocal(lengthOverRoughness: number): number {
  const base = 2.635 + 0.618 * Math.log(lengthOverRoughness);
  return base ** -2.57 * (1 - (2.57 * 0.618) / base);
}

export const FULLY_ROUGH_MILLS_HANG = roughLine({
  name: "fully-rough-mills-hang",
  title: "Mills & Hang, fully rough",
  formula: "C_F = (2.635 + 0.618 ln(x/k_s))^−2.57",
  source: "Mills & Hang, J. Fluids Eng. 105 (1983) 364–365",
  reynoldsRange: { min: 1e3, max: 1e10 },
  lengthOverRoughnessRange: { min: 150, max: 1.5e7 },
  mean: millsHangMean,
  local: millsHangLocal,
});
