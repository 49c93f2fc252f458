import type { FrictionLine, TurbulentLayer } from "./friction-line";

/** Below this x/k_s a fully rough line keeps its coefficient. */
export const HELD_BELOW_LENGTH_OVER_ROUGHNESS = 100;

type RoughLineSpec = Omit<FrictionLine, "surface" | "profile" | "turbulentLayer"> & {
  /** C_F(x/k_s). */
  mean(lengthOverRoughness: number): number;
  /** d(x·C_F)/dx. */
  local(lengthOverRoughness: number): number;
};

/** A line for surfaces so rough that viscosity drops out. It has no Blasius part. */
export function roughLine({ mean, local, ...line }: RoughLineSpec): FrictionLine {
  const held = mean(HELD_BELOW_LENGTH_OVER_ROUGHNESS);
  const turbulentLayer = (roughnessReynolds: number): TurbulentLayer => {
    if (!(roughnessReynolds > 0)) throw new RangeError(`a fully rough line needs Re_k > 0, got ${roughnessReynolds}`);
    const end = HELD_BELOW_LENGTH_OVER_ROUGHNESS * roughnessReynolds;
    return {
      blasiusBelow: 0,
      isBlasiusAt: () => false,
      frictionIntegral: (reynolds) => reynolds * (reynolds < end ? held : mean(reynolds / roughnessReynolds)),
      localCoefficient: (reynolds) => (reynolds < end ? held : local(reynolds / roughnessReynolds)),
      pieceAt: (reynolds) => (reynolds < end ? "held" : line.name),
    };
  };
  return { ...line, surface: "rough", profile: "none", turbulentLayer };
}
