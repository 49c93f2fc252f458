import { frictionBetween } from "@/lib/aero/friction/friction-between";
import { isBelow, isBeyond } from "@/lib/aero/friction/transition";
import { layerThickness } from "@/lib/aero/layer-thickness";
import { roughnessVerdict } from "@/lib/aero/roughness-verdict";
import { numberOf } from "../document/number-input";
import type { Note } from "../notes/note";
import { makeNote } from "../notes/note-catalogue";
import { frictionNotes } from "./friction-notes";
import { frictionSetup, type FrictionCase, type FrictionSetup } from "./friction-setup";
import type { FrictionAnswer } from "./friction-answer";
import type { StreamState } from "./stream-state";

/** Re at the end of a layer that any friction line stands for. */
export const ADMITTED_REYNOLDS = { min: 1e3, max: 1e10 };
/** Below this Re no layer is taken to turn turbulent, but from its very start. */
export const LOWEST_TRANSITION_REYNOLDS = 1e4;

export type FrictionResult =
  { outcome: "refused"; note: Note } | { outcome: "answer"; setup: FrictionSetup; answer: FrictionAnswer };

/**
 * Friction of one stretch of a layer, x₀ to x₀ + L.
 *
 * @param stream as the surface sees it
 * @param newtonsPerMetre drag per metre of F(x₀+L) − F(x₀): q, width of all faces and form factor in one
 */
export function frictionResult(friction: FrictionCase, stream: StreamState, newtonsPerMetre: number): FrictionResult {
  const setup = frictionSetup(friction, stream);
  const note = refusalOf(setup);
  if (note) return { outcome: "refused", note };

  const at = layerQuantitiesAt(setup, stream, setup.endReynolds);
  const stretch = stretchOf(setup, at.momentumThickness);
  // Field by field: copying whole objects costs more than the formulas.
  const answer: FrictionAnswer = {
    drag: newtonsPerMetre * stretch,
    reynolds: at.reynolds,
    localCoefficient: at.localCoefficient,
    frictionLineUsed: at.frictionLineUsed,
    thickness: at.thickness,
    displacementThickness: at.displacementThickness,
    momentumThickness: at.momentumThickness,
    wallShearStress: at.wallShearStress,
    admissibleRoughness: at.admissibleRoughness,
    roughnessReynolds: at.roughnessReynolds,
    roughnessVerdict: at.roughnessVerdict,
    meanCoefficient: stretch / friction.length,
    notes: [],
  };
  const transitionAt = transitionPlace(friction, setup);
  if (transitionAt !== undefined) answer.transitionAt = transitionAt;
  const { isThicknessBorrowed } = at;
  answer.notes = frictionNotes({ friction, setup, answer, newtonsPerMetre, isThicknessBorrowed, stream });
  return { outcome: "answer", setup, answer };
}

/** F(x₀ + L) − F(x₀) [m]; F is 0 at the start of a layer and 2θ at its end. */
function stretchOf({ layer, viscousLength, startReynolds, spanReynolds }: FrictionSetup, endTheta: number): number {
  if (startReynolds === 0) return 2 * endTheta;
  return viscousLength * frictionBetween(layer, startReynolds, spanReynolds);
}

function refusalOf({ endReynolds, askedTransition }: FrictionSetup): Note | null {
  const { min, max } = ADMITTED_REYNOLDS;
  if (isBelow(endReynolds, min) || isBelow(max, endReynolds)) {
    return makeNote("reynolds-outside-every-line", { reynolds: endReynolds, min, max });
  }
  if (askedTransition.kind === "at" && isBelow(askedTransition.reynolds, LOWEST_TRANSITION_REYNOLDS)) {
    return makeNote("transition-below-limit", {
      transitionReynolds: askedTransition.reynolds,
      limit: LOWEST_TRANSITION_REYNOLDS,
    });
  }
  return null;
}

/** What the layer is at one place, by Re from its start; Re > 0. */
export function layerQuantitiesAt(setup: FrictionSetup, stream: StreamState, reynolds: number) {
  const { layer, viscousLength } = setup;
  const frictionIntegral = layer.frictionIntegral(reynolds);
  const localCoefficient = layer.localCoefficient(reynolds);
  const momentumThickness = (frictionIntegral / 2) * viscousLength;
  const frictionLineUsed = layer.lineAt(reynolds);
  const roughnessReynolds = setup.roughnessReynolds * Math.sqrt(localCoefficient / 2);
  const { thickness, displacementThickness, isBorrowed } = layerThickness(
    frictionLineUsed,
    momentumThickness,
    reynolds,
    frictionIntegral / 2,
    setup.roughnessReynolds,
  );
  return {
    reynolds,
    localCoefficient,
    frictionLineUsed,
    thickness,
    displacementThickness,
    momentumThickness,
    wallShearStress: stream.dynamicPressure * localCoefficient,
    admissibleRoughness: setup.admissibleRoughness,
    roughnessReynolds,
    roughnessVerdict: roughnessVerdict(setup.isSmoothEnough, roughnessReynolds),
    isThicknessBorrowed: isBorrowed,
  };
}

/** m from the start of the layer; nothing where transition is not reached. */
function transitionPlace({ transition }: FrictionCase, setup: FrictionSetup): number | undefined {
  if (setup.transition.kind === "from-start") return 0;
  if (setup.transition.kind === "never" || !isBeyond(setup.endReynolds, setup.transition.reynolds)) return undefined;
  return transition.kind === "tripped" ? numberOf(transition.at) : setup.transition.reynolds * setup.viscousLength;
}
