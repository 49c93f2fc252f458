import type { Range } from "../range";
import type { FrictionLineName } from "./friction-line-name";

/** Profile by which a line gives δ and δ* from θ; `none` where it has no profile of its own. */
export type LineProfile = "one-seventh-power" | "wall-and-wake" | "none";

/** A friction line of a flat plate: mean friction of a layer that is turbulent from its start. */
export interface FrictionLine {
  name: FrictionLineName;
  /** As it is printed. */
  title: string;
  /** Mean coefficient as an equation. */
  formula: string;
  source: string;
  reynoldsRange: Range;
  /** x/k_s, where the line has such a range. */
  lengthOverRoughnessRange?: Range;
  /** The surface it stands for: smooth, any (k_s enters), or one so rough that viscosity drops out. */
  surface: "smooth" | "any" | "rough";
  profile: LineProfile;
  /** The layer on a surface with roughness Reynolds number Re_k = U k_s/ν. */
  turbulentLayer(roughnessReynolds: number): TurbulentLayer;
}

/** A layer that is turbulent from its start. All functions take Re = U x/ν > 0. */
export interface TurbulentLayer {
  /** Below this Re, F is Blasius's; 0 where the line has no Blasius part. May be dear: `isBlasiusAt` is not. */
  readonly blasiusBelow: number;
  isBlasiusAt(reynolds: number): boolean;
  /** Re·C_F = F U/ν = 2 Re_θ. */
  frictionIntegral(reynolds: number): number;
  /** d(Re·C_F)/dRe = dF/dx. */
  localCoefficient(reynolds: number): number;
  /** Name of the formula in force: within one name F is smooth. */
  pieceAt(reynolds: number): string;
  /** Re at which this layer has that friction integral. Where a line has it, θ is kept continuous at transition. */
  reynoldsOf?(frictionIntegral: number): number;
}
