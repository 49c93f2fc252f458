import { requireAbove } from "../require-above";
import { blasiusFrictionIntegral, blasiusLocalCoefficient } from "./blasius";
import type { FrictionLine } from "./friction-line";

/** Below it Blasius takes over, scaled to join: the line crosses Blasius nowhere and has a pole at Re = 100. */
const JOIN = 1e4;
const JOIN_SCALE = (JOIN * ittc1957Mean(JOIN)) / blasiusFrictionIntegral(JOIN);

/**
 * Mean friction coefficient of the ITTC-1957 line.
 *
 *   C_F = 0.075/(log₁₀ Re − 2)²
 *
 * @param reynolds Re = U x/ν [-], 1e5 to 1e10
 * @returns C_F of one side, on its wetted area [-]
 * @throws RangeError if Re ≤ 100: there the formula has no value
 *
 * Source: 8th International Towing Tank Conference, Madrid 1957; ITTC procedure 7.5-02-02-01. It is a line for correlating
 * models with ships and lies above flat-plate lines at low Re. Worked: Re = 1e7 gives 0.003.
 */
export function ittc1957Mean(reynolds: number): number {
  requireAbove(100, reynolds, "Re");
  return 0.075 / (Math.log10(reynolds) - 2) ** 2;
}

/** Local coefficient dF/dx = C_F (1 − 2/(ln Re − 2 ln 10)) [-]. */
export function ittc1957Local(reynolds: number): number {
  return ittc1957Mean(reynolds) * (1 - 2 / (Math.log(reynolds) - 2 * Math.LN10));
}

const LAYER = {
  blasiusBelow: 0,
  isBlasiusAt: () => false,
  frictionIntegral: (reynolds: number) =>
    reynolds < JOIN ? JOIN_SCALE * blasiusFrictionIntegral(reynolds) : reynolds * ittc1957Mean(reynolds),
  localCoefficient: (reynolds: number) =>
    reynolds < JOIN ? JOIN_SCALE * blasiusLocalCoefficient(reynolds) : ittc1957Local(reynolds),
  pieceAt: (reynolds: number) => (reynolds < JOIN ? "scaled-blasius" : "ittc-1957"),
};

export const ITTC_1957: FrictionLine = {
  name: "ittc-1957",
  title: "ITTC-1957",
  formula: "C_F = 0.075/(log₁₀ Re − 2)²",
  source: "ITTC, Madrid 1957; procedure 7.5-02-02-01",
  reynoldsRange: { min: 1e5, max: 1e10 },
  surface: "smooth",
  profile: "none",
  turbulentLayer: () => LAYER,
};
