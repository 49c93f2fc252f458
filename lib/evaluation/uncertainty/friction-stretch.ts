import { admissibleRoughness } from "@/lib/aero/admissible-roughness";
import { automaticTransition } from "@/lib/aero/friction/automatic-layer";
import { frictionBetween } from "@/lib/aero/friction/friction-between";
import type { FrictionLayer } from "@/lib/aero/friction/friction-layer";
import type { FrictionLines } from "@/lib/aero/friction/friction-lines";
import { isBelow, type Transition } from "@/lib/aero/friction/transition";
import { numberOf, type NumberInput } from "../document/number-input";
import { ADMITTED_REYNOLDS } from "../methods/friction-result";
import { layerOf, transitionOf, type FrictionCase } from "../methods/friction-setup";

type Surface = Pick<FrictionCase, "transition" | "frictionLine"> & { roughness: NumberInput };

/** The friction of a stretch of layer, without its thicknesses and notes. The local speed and ν, then lengths, SI. */
export interface FrictionStretch {
  /** F(x₀ + L) − F(x₀), m; NaN outside every line. */
  metres(speed: number, kinematicViscosity: number, length: number, runUp: number): number;
  /** Within one name the metres are a smooth function of every input. */
  regime(speed: number, kinematicViscosity: number, length: number, runUp: number): string;
}

interface KnownLayer {
  layer: FrictionLayer;
  roughnessReynolds: number;
  transition: Transition;
}

/**
 * The stretch of a surface as that stands at the moment. A layer that is the same as at the last call is not made again:
 * of smooth lines with natural transition it is one for all draws.
 */
export function frictionStretch(surface: Surface, lines: FrictionLines): FrictionStretch {
  const { frictionLine } = surface;
  const isSmoothLine = frictionLine !== "automatic" && lines[frictionLine].surface === "smooth";
  const settled = settledTransition(surface);
  let last: KnownLayer | null = null;

  const layerAt = (speed: number, kinematicViscosity: number): KnownLayer => {
    if (last && settled && isSmoothLine) return last;
    const roughness = numberOf(surface.roughness);
    const asked = settled ?? transitionOf(surface, (length) => (speed * length) / kinematicViscosity);
    const transition =
      frictionLine === "automatic"
        ? automaticTransition(asked, !isBelow(admissibleRoughness(speed, kinematicViscosity), roughness))
        : asked;
    const roughnessReynolds = isSmoothLine ? 0 : (speed * roughness) / kinematicViscosity;
    if (last?.roughnessReynolds === roughnessReynolds && isSame(last.transition, transition)) return last;
    last = { layer: layerOf({ frictionLine, lines }, roughnessReynolds, transition), roughnessReynolds, transition };
    return last;
  };

  return {
    metres: (speed, kinematicViscosity, length, runUp) => {
      const end = (speed * (runUp + length)) / kinematicViscosity;
      if (!isAdmitted(end)) return Number.NaN;
      const { layer } = layerAt(speed, kinematicViscosity);
      // F is 0 at the start of a layer.
      if (runUp === 0) return (kinematicViscosity / speed) * layer.frictionIntegral(end);
      const start = (speed * runUp) / kinematicViscosity;
      return (kinematicViscosity / speed) * frictionBetween(layer, start, (speed * length) / kinematicViscosity);
    },
    regime: (speed, kinematicViscosity, length, runUp) => {
      const { layer, transition } = layerAt(speed, kinematicViscosity);
      const start = layer.pieceAt((speed * runUp) / kinematicViscosity);
      return `${transition.kind}|${start}|${layer.pieceAt((speed * (runUp + length)) / kinematicViscosity)}`;
    },
  };
}

/** The transition that is the same at every speed and viscosity; null where it is not. */
function settledTransition(surface: Surface): Transition | null {
  const { transition } = surface;
  if (transition.kind === "natural" && typeof transition.criticalReynolds !== "number") return null;
  if (transition.kind === "tripped" && transition.at !== 0) return null;
  return transitionOf(surface, (length) => length);
}

function isAdmitted(reynolds: number): boolean {
  return !isBelow(reynolds, ADMITTED_REYNOLDS.min) && !isBelow(ADMITTED_REYNOLDS.max, reynolds);
}

function isSame(one: Transition, other: Transition): boolean {
  if (one.kind === "at" && other.kind === "at") return one.reynolds === other.reynolds;
  return one.kind === other.kind;
}
