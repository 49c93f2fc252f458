import { risingRoot } from "../numerics/rising-root";
import { blasiusFrictionIntegral, blasiusLocalCoefficient } from "./blasius";
import type { FrictionLine } from "./friction-line";

type SmoothLineSpec = Omit<FrictionLine, "surface" | "turbulentLayer"> & {
  /** C_F(Re). */
  mean(reynolds: number): number;
  /** d(Re·C_F)/dRe. */
  local(reynolds: number): number;
};

/** A line for smooth surfaces that is Blasius's below the greatest Re at which it crosses Blasius. */
export function smoothLine({ mean, local, ...line }: SmoothLineSpec): FrictionLine {
  const blasiusBelow = crossingWithBlasius(mean);
  const layer = {
    blasiusBelow,
    isBlasiusAt: (reynolds: number) => reynolds < blasiusBelow,
    frictionIntegral: (reynolds: number) =>
      reynolds < blasiusBelow ? blasiusFrictionIntegral(reynolds) : reynolds * mean(reynolds),
    localCoefficient: (reynolds: number) =>
      reynolds < blasiusBelow ? blasiusLocalCoefficient(reynolds) : local(reynolds),
    pieceAt: (reynolds: number) => (reynolds < blasiusBelow ? "blasius" : line.name),
  };
  return { ...line, surface: "smooth", turbulentLayer: () => layer };
}

/**
 * Greatest Re at which a mean line crosses Blasius. Every smooth line lies below Blasius at Re 1e3 and above at 1e6,
 * with one crossing between.
 */
function crossingWithBlasius(mean: (reynolds: number) => number): number {
  return risingRoot((reynolds) => reynolds * mean(reynolds) - blasiusFrictionIntegral(reynolds), 1e3, 1e6);
}
