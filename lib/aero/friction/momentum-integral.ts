import { risingRoot } from "../numerics/rising-root";
import { blasiusFrictionIntegral, blasiusLocalCoefficient } from "./blasius";
import type { FrictionLine, TurbulentLayer } from "./friction-line";
import {
  localCoefficientAt,
  reynoldsAt,
  reynoldsThetaAt,
  ROUGHNESS_COEFFICIENT,
  stateAtReynolds,
  stateAtReynoldsTheta,
} from "./wall-and-wake";

/**
 * The momentum integral with the law of the wall and wake as a friction line, smooth and rough.
 *
 *   C_F = 2 Re_θ/Re
 *
 * Below its own crossing with Blasius, which depends on the roughness, F is Blasius's. At transition θ is continuous: the
 * layer goes on from where a wholly turbulent one has that θ.
 *
 * Source and constants: see wall-and-wake. Worked: smooth, Re = 1e7 gives C_F = 0.00291174, local C_f = 0.00246844.
 */
export const MOMENTUM_INTEGRAL: FrictionLine = {
  name: "momentum-integral",
  title: "Momentum integral, wall and wake",
  formula: "C_F = 2 Re_θ/Re, with dRe_θ/dRe = 1/λ² and Re_θ(λ) of the wall-and-wake profile",
  source: "Coles, J. Fluid Mech. 1 (1956) 191–226; von Kármán 1921",
  reynoldsRange: { min: 1e6, max: 1e9 },
  lengthOverRoughnessRange: { min: 500, max: Infinity },
  surface: "any",
  profile: "wall-and-wake",
  turbulentLayer: momentumIntegralLayer,
};

/** The smooth layer's crossing lies just below; roughness lowers it. */
const HIGHEST_CROSSING = 21_354;

function momentumIntegralLayer(roughnessReynolds: number): TurbulentLayer {
  const r = ROUGHNESS_COEFFICIENT * roughnessReynolds;
  let crossing: number | null = null;
  // Found on demand: hardly any layer ends so near its start.
  const crossingOnce = (): number => (crossing ??= crossingWithBlasius(r));
  const isBlasiusAt = (reynolds: number): boolean => reynolds < HIGHEST_CROSSING && reynolds < crossingOnce();
  return {
    get blasiusBelow() {
      return crossingOnce();
    },
    isBlasiusAt,
    frictionIntegral: (reynolds) =>
      isBlasiusAt(reynolds) ? blasiusFrictionIntegral(reynolds) : 2 * reynoldsThetaAt(stateAtReynolds(reynolds, r), r),
    localCoefficient: (reynolds) =>
      isBlasiusAt(reynolds) ? blasiusLocalCoefficient(reynolds) : localCoefficientAt(stateAtReynolds(reynolds, r)),
    pieceAt: (reynolds) => (isBlasiusAt(reynolds) ? "blasius" : "momentum-integral"),
    reynoldsOf: (frictionIntegral) => {
      const atCrossing = blasiusFrictionIntegral(HIGHEST_CROSSING);
      if (frictionIntegral <= atCrossing && frictionIntegral <= blasiusFrictionIntegral(crossingOnce())) {
        // Blasius's F grows with the root of Re.
        return crossingOnce() * (frictionIntegral / blasiusFrictionIntegral(crossingOnce())) ** 2;
      }
      return reynoldsAt(stateAtReynoldsTheta(frictionIntegral / 2, r), r);
    },
  };
}

/** Re at which the line crosses Blasius: 21 353 smooth, down to 843 for any roughness (C_F cannot exceed 2 (A/C)²). */
function crossingWithBlasius(r: number): number {
  const excess = (logU: number): number => {
    const u = Math.exp(logU);
    return 2 * reynoldsThetaAt(u, r) - blasiusFrictionIntegral(reynoldsAt(u, r));
  };
  return reynoldsAt(Math.exp(risingRoot(excess, LOWEST_LOG_STATE, HIGHEST_LOG_STATE)), r);
}

const LOWEST_LOG_STATE = -120;
const HIGHEST_LOG_STATE = Math.log(30);
