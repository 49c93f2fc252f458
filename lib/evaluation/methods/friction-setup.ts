import { admissibleRoughness } from "@/lib/aero/admissible-roughness";
import { automaticLayer, automaticTransition } from "@/lib/aero/friction/automatic-layer";
import { frictionLayer, type FrictionLayer } from "@/lib/aero/friction/friction-layer";
import type { FrictionLineName } from "@/lib/aero/friction/friction-line-name";
import type { FrictionLines } from "@/lib/aero/friction/friction-lines";
import { isBelow, type Transition } from "@/lib/aero/friction/transition";
import { numberOf } from "../document/number-input";
import type { InputOf, TransitionInput } from "../document/schema";
import type { StreamState } from "./stream-state";

/** The friction fields that a plate and the walls of a duct share, as plain numbers. */
export interface FrictionCase {
  length: number;
  runUp: number;
  roughness: number;
  transition: TransitionInput;
  frictionLine: FrictionLineName | "automatic";
  /** As the version of the method has them. */
  lines: FrictionLines;
}

/** A friction case in its stream, in the dimensionless numbers that lines take. */
export interface FrictionSetup {
  /** ν/U [m]: a length over it is a Re. */
  viscousLength: number;
  startReynolds: number;
  spanReynolds: number;
  endReynolds: number;
  /** Re_k = U k_s/ν. */
  roughnessReynolds: number;
  admissibleRoughness: number;
  isSmoothEnough: boolean;
  /** As it was asked for. */
  askedTransition: Transition;
  /** As it takes effect. */
  transition: Transition;
  layer: FrictionLayer;
}

export function plateCase(input: InputOf<"flat-plate-friction">, lines: FrictionLines): FrictionCase {
  return frictionCase(input, numberOf(input.runUp), lines);
}

export function ductCase(input: InputOf<"duct-entry">, lines: FrictionLines): FrictionCase {
  return frictionCase(input, 0, lines);
}

function frictionCase(
  input: InputOf<"flat-plate-friction" | "duct-entry">,
  runUp: number,
  lines: FrictionLines,
): FrictionCase {
  return {
    length: numberOf(input.length),
    runUp,
    roughness: numberOf(input.roughness),
    transition: input.transition,
    frictionLine: input.frictionLine,
    lines,
  };
}

/** Sets a friction case up in the stream that the surface sees. */
export function frictionSetup(friction: FrictionCase, stream: StreamState): FrictionSetup {
  const viscousLength = stream.kinematicViscosity / stream.speed;
  const admissible = admissibleRoughness(stream.speed, stream.kinematicViscosity);
  const reynoldsOf = (length: number): number => (stream.speed * length) / stream.kinematicViscosity;
  const isSmoothEnough = !isBelow(admissible, friction.roughness);
  const roughnessReynolds = reynoldsOf(friction.roughness);
  const askedTransition = transitionOf(friction, reynoldsOf);
  const isAutomatic = friction.frictionLine === "automatic";
  const transition = isAutomatic ? automaticTransition(askedTransition, isSmoothEnough) : askedTransition;
  return {
    viscousLength,
    startReynolds: reynoldsOf(friction.runUp),
    spanReynolds: reynoldsOf(friction.length),
    endReynolds: reynoldsOf(friction.runUp + friction.length),
    roughnessReynolds,
    admissibleRoughness: admissible,
    isSmoothEnough,
    askedTransition,
    transition,
    layer: layerOf(friction, roughnessReynolds, transition),
  };
}

export function layerOf(
  { frictionLine, lines }: Pick<FrictionCase, "frictionLine" | "lines">,
  roughnessReynolds: number,
  transition: Transition,
): FrictionLayer {
  return frictionLine === "automatic"
    ? automaticLayer(roughnessReynolds, transition)
    : frictionLayer(lines[frictionLine], roughnessReynolds, transition);
}

/** A trip keeps its place wherever the plate ends, so that a plate and its parts see one layer. */
export function transitionOf(
  { transition }: Pick<FrictionCase, "transition">,
  reynoldsOf: (length: number) => number,
): Transition {
  switch (transition.kind) {
    case "natural":
      return { kind: "at", reynolds: numberOf(transition.criticalReynolds) };
    case "tripped": {
      const at = numberOf(transition.at);
      return at === 0 ? { kind: "from-start" } : { kind: "at", reynolds: reynoldsOf(at) };
    }
    case "laminar":
      return { kind: "never" };
  }
}
