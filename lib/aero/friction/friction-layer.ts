import { blasiusFrictionIntegral, blasiusLocalCoefficient } from "./blasius";
import type { FrictionLine, TurbulentLayer } from "./friction-line";
import type { FrictionLineName } from "./friction-line-name";
import { isBeyond, type Transition } from "./transition";

/** A layer from its start, laminar stretch and all. All functions take Re = U x/ν, 0 or greater. */
export interface FrictionLayer {
  /** Re·C_F = F U/ν = 2 Re_θ; rises with Re. */
  frictionIntegral(reynolds: number): number;
  /** dF/dx; Re > 0. */
  localCoefficient(reynolds: number): number;
  /** The line that gives F there. */
  lineAt(reynolds: number): FrictionLineName | "blasius";
  /** Name of the formula in force: within one name F is smooth. */
  pieceAt(reynolds: number): string;
}

/**
 * The layer on a surface by one friction line, with its laminar stretch.
 *
 * To and at transition it is Blasius's. Beyond, the turbulent layer is kept as from the leading edge and its first part
 * replaced by the laminar one: F = F_t − A, A = F_t(x_tr) − F_l(x_tr), exact for the line in use (L. Prandtl 1927;
 * Schlichting, Boundary-Layer Theory, 7th ed. 1979, ch. XXI). A line that can tell where its layer has a given θ keeps θ
 * continuous instead: it goes on from there.
 *
 * @param roughnessReynolds Re_k = U k_s/ν [-]
 * Worked: Prandtl–Schlichting, transition at Re 5e5: A = 1613.82 (Re·C_F at Re 1e7: 30037.1 − 1613.8).
 */
export function frictionLayer(line: FrictionLine, roughnessReynolds: number, transition: Transition): FrictionLayer {
  if (transition.kind === "never") return LAMINAR_LAYER;
  const turbulent = line.turbulentLayer(roughnessReynolds);
  if (transition.kind === "from-start") return fromStart(line.name, turbulent);
  const last = line.surface === "smooth" ? LAST_MIXED.get(turbulent) : undefined;
  if (last?.transitionReynolds === transition.reynolds) return last.layer;
  const layer = withLaminarStretch(line.name, turbulent, transition.reynolds);
  if (line.surface === "smooth") LAST_MIXED.set(turbulent, { transitionReynolds: transition.reynolds, layer });
  return layer;
}

/** Of a smooth line the layer depends on its transition alone, and most plates of a budget have one and the same. */
const LAST_MIXED = new WeakMap<TurbulentLayer, { transitionReynolds: number; layer: FrictionLayer }>();

const LAMINAR_LAYER: FrictionLayer = {
  frictionIntegral: blasiusFrictionIntegral,
  localCoefficient: blasiusLocalCoefficient,
  lineAt: () => "blasius",
  pieceAt: () => "laminar",
};

function fromStart(name: FrictionLineName, turbulent: TurbulentLayer): FrictionLayer {
  return {
    frictionIntegral: (reynolds) => (reynolds > 0 ? turbulent.frictionIntegral(reynolds) : 0),
    localCoefficient: turbulent.localCoefficient,
    lineAt: (reynolds) => (turbulent.isBlasiusAt(reynolds) ? "blasius" : name),
    pieceAt: turbulent.pieceAt,
  };
}

function withLaminarStretch(
  name: FrictionLineName,
  turbulent: TurbulentLayer,
  transitionReynolds: number,
): FrictionLayer {
  const laminar = blasiusFrictionIntegral(transitionReynolds);
  const { shift, excess } = continuation(turbulent, transitionReynolds, laminar);
  const isLaminar = (reynolds: number): boolean => !isBeyond(reynolds, transitionReynolds);
  return {
    frictionIntegral: (reynolds) =>
      isLaminar(reynolds) ? blasiusFrictionIntegral(reynolds) : turbulent.frictionIntegral(reynolds + shift) - excess,
    localCoefficient: (reynolds) =>
      isLaminar(reynolds) ? blasiusLocalCoefficient(reynolds) : turbulent.localCoefficient(reynolds + shift),
    lineAt: (reynolds) => (isLaminar(reynolds) || turbulent.isBlasiusAt(reynolds + shift) ? "blasius" : name),
    pieceAt: (reynolds) => (isLaminar(reynolds) ? "laminar" : turbulent.pieceAt(reynolds + shift)),
  };
}

/** Past transition F(Re) = F_t(Re + shift) − excess: a shift where θ is kept continuous, an excess elsewhere. */
function continuation(
  turbulent: TurbulentLayer,
  transitionReynolds: number,
  laminar: number,
): { shift: number; excess: number } {
  if (turbulent.isBlasiusAt(transitionReynolds)) return { shift: 0, excess: 0 };
  if (turbulent.reynoldsOf) return { shift: turbulent.reynoldsOf(laminar) - transitionReynolds, excess: 0 };
  return { shift: 0, excess: turbulent.frictionIntegral(transitionReynolds) - laminar };
}
