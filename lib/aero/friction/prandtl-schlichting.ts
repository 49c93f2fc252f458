import { requireAbove } from "../require-above";
import { smoothLine } from "./smooth-line";

/**
 * Mean friction coefficient of a smooth plate (Prandtl–Schlichting).
 *
 *   C_F = 0.455/(log₁₀ Re)^2.58
 *
 * @param reynolds Re = U x/ν [-], 5e5 to 1e9
 * @returns C_F of one side, on its wetted area [-]
 * @throws RangeError if Re ≤ 1: there the formula has no value
 *
 * Source: H. Schlichting, Boundary-Layer Theory, 7th ed. 1979, eq. (21.16) (number from memory).
 * Worked: Re = 1e7 gives 0.0030037.
 */
export function prandtlSchlichtingMean(reynolds: number): number {
  requireAbove(1, reynolds, "Re");
  return 0.455 / Math.log10(reynolds) ** 2.58;
}

/** Local coefficient dF/dx = C_F (1 − 2.58/ln Re) [-]; the printed (2 log₁₀ Re − 0.65)^−2.3 lies 2 to 3.5 % above it. */
export function prandtlSchlichtingLocal(reynolds: number): number {
  return prandtlSchlichtingMean(reynolds) * (1 - 2.58 / Math.log(reynolds));
}

export const PRANDTL_SCHLICHTING = smoothLine({
  name: "prandtl-schlichting",
  title: "Prandtl–Schlichting",
  formula: "C_F = 0.455/(log₁₀ Re)^2.58",
  source: "Schlichting, Boundary-Layer Theory, 7th ed. 1979, ch. XXI",
  reynoldsRange: { min: 5e5, max: 1e9 },
  profile: "none",
  mean: prandtlSchlichtingMean,
  local: prandtlSchlichtingLocal,
});
