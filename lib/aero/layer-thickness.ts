import { BLASIUS_SHAPE_FACTOR, BLASIUS_THICKNESS_RATIO } from "./friction/blasius";
import type { FrictionLineName } from "./friction/friction-line-name";
import { FRICTION_LINES } from "./friction/friction-lines";
import { ROUGHNESS_COEFFICIENT, shapeFactorAt, stateAtReynoldsTheta, thicknessRatioAt } from "./friction/wall-and-wake";

export interface LayerThickness {
  /** δ, in the unit of θ. */
  thickness: number;
  /** δ*, in the unit of θ. */
  displacementThickness: number;
  /** The line has no profile of its own, so that the wall-and-wake profile stands in. */
  isBorrowed: boolean;
}

/** Roughness that a borrowed profile is given at most, as a part of x. */
const LARGEST_BORROWED_ROUGHNESS = 1 / 100;

/**
 * δ and δ* of a layer from its momentum thickness.
 *
 *   Blasius: δ = 5.0/0.664 θ, δ* = 1.7208/0.664 θ;  power laws: δ = 72/7 θ, δ* = 9/7 θ
 *   momentum integral: wall-and-wake profile at Re_θ with Re_k;  other lines: the same with Re_k at most Re/100
 *
 * @param line the line that gives F at the end
 * @param momentumThickness θ [m]
 * @param reynolds Re = U x/ν at the end [-]
 * @param reynoldsTheta Re_θ = U θ/ν [-]
 * @param roughnessReynolds Re_k = U k_s/ν [-]
 *
 * Source: Blasius 1908; H. Schlichting, Boundary-Layer Theory, 7th ed. 1979 (one-seventh profile: δ/θ = 72/7, δ/δ* = 8);
 * Coles 1956. Worked: one-fifth law, Re 1e6, x = 1 m: θ = 0.0023345, δ* = 0.0030016, δ = 0.024012 m.
 */
export function layerThickness(
  line: FrictionLineName | "blasius",
  momentumThickness: number,
  reynolds: number,
  reynoldsTheta: number,
  roughnessReynolds: number,
): LayerThickness {
  const scaled = (ratio: number, shapeFactor: number, isBorrowed = false): LayerThickness => ({
    thickness: ratio * momentumThickness,
    displacementThickness: shapeFactor * momentumThickness,
    isBorrowed,
  });
  if (line === "blasius") return scaled(BLASIUS_THICKNESS_RATIO, BLASIUS_SHAPE_FACTOR);
  const { profile } = FRICTION_LINES[line];
  if (profile === "one-seventh-power") return scaled(72 / 7, 9 / 7);
  const isBorrowed = profile === "none";
  const roughness = isBorrowed ? Math.min(roughnessReynolds, LARGEST_BORROWED_ROUGHNESS * reynolds) : roughnessReynolds;
  const state = stateAtReynoldsTheta(reynoldsTheta, ROUGHNESS_COEFFICIENT * roughness);
  return scaled(thicknessRatioAt(state), shapeFactorAt(state), isBorrowed);
}
