import { frictionLayer, type FrictionLayer } from "./friction-layer";
import { FULLY_ROUGH } from "./fully-rough";
import { PRANDTL_SCHLICHTING } from "./prandtl-schlichting";
import type { Transition } from "./transition";

/** Where the automatic choice is meant to be used. */
export const AUTOMATIC_RANGE = { min: 1e5, max: 1e9 };

/**
 * The layer that `automatic` takes: at every x the greater F of Prandtl–Schlichting and Schlichting's fully rough line,
 * each with its own laminar stretch taken off. Common practice, no source.
 *
 * @param roughnessReynolds Re_k = U k_s/ν [-]; 0 leaves the smooth line alone
 * @param transition as it takes effect, see `automaticTransition`
 * Worked: Re 3.984e6, x/k_s = 2500, turbulent from the start: the rough line governs with C_F = 0.0067252.
 */
export function automaticLayer(roughnessReynolds: number, transition: Transition): FrictionLayer {
  const smooth = frictionLayer(PRANDTL_SCHLICHTING, 0, transition);
  if (roughnessReynolds === 0 || transition.kind === "never") return smooth;
  const rough = frictionLayer(FULLY_ROUGH, roughnessReynolds, transition);
  const governing = (reynolds: number): FrictionLayer =>
    rough.frictionIntegral(reynolds) > smooth.frictionIntegral(reynolds) ? rough : smooth;
  return {
    frictionIntegral: (re) => Math.max(smooth.frictionIntegral(re), rough.frictionIntegral(re)),
    localCoefficient: (re) => governing(re).localCoefficient(re),
    lineAt: (re) => governing(re).lineAt(re),
    pieceAt: (re) => governing(re).pieceAt(re),
  };
}

/** Roughness above the admissible height makes the layer turbulent from its start, unless it is held laminar. */
export function automaticTransition(transition: Transition, isSmoothEnough: boolean): Transition {
  return isSmoothEnough || transition.kind === "never" ? transition : { kind: "from-start" };
}
