import { isBeyond } from "@/lib/aero/friction/transition";
import { layerQuantitiesAt } from "@/lib/evaluation/methods/friction-result";

import type { FrictionSubject } from "./friction-subject";
import { evenly } from "./plot-layout";

export interface LayerStation {
  /** m from the start of the layer. */
  place: number;
  regime: "laminar" | "turbulent";
  /** δ, δ*, θ in m. */
  thickness: number;
  displacementThickness: number;
  momentumThickness: number;
  /** τ_w in Pa. */
  wallShearStress: number;
}

export interface LayerGrowth {
  stations: LayerStation[];
  /** m of wetted length ahead of the plate. */
  runUp: number;
  /** End of the plate, m from the start of the layer. */
  end: number;
  /** m from the start; 0 where it is turbulent from there, null where it stays laminar. */
  transitionAt: number | null;
}

const STATIONS = 81;
/** A layer has no thickness and no bounded shear at its very start. */
const FIRST = 1e-3;
/** Two stations this close, relative to the place, stand on either side of transition. */
const BESIDE = 1e-9;

/** The layer from its start to the end of the plate, by the functions that give the item's own values there. */
export function layerGrowth(subject: FrictionSubject, stations = STATIONS): LayerGrowth {
  const { friction, setup } = subject;
  const end = friction.runUp + friction.length;
  const transitionAt = transitionPlace(subject);
  const beside = transitionAt !== null && transitionAt > 0 ? [transitionAt, transitionAt * (1 + BESIDE)] : [];
  const places = [...evenly(end * FIRST, end, stations), ...beside].sort((one, other) => one - other);
  return {
    stations: places.map((place) => stationAt(subject, place, transitionAt)),
    runUp: friction.runUp,
    end,
    transitionAt: setup.transition.kind === "from-start" ? 0 : transitionAt,
  };
}

function stationAt({ setup, stream }: FrictionSubject, place: number, transitionAt: number | null): LayerStation {
  const at = layerQuantitiesAt(setup, stream, place / setup.viscousLength);
  const { thickness, displacementThickness, momentumThickness, wallShearStress } = at;
  const regime = transitionAt === null || !isBeyond(place, transitionAt) ? "laminar" : "turbulent";
  return { place, regime, thickness, displacementThickness, momentumThickness, wallShearStress };
}

function transitionPlace({ setup }: FrictionSubject): number | null {
  const { transition, viscousLength, endReynolds } = setup;
  if (transition.kind === "from-start") return 0;
  if (transition.kind === "never" || !isBeyond(endReynolds, transition.reynolds)) return null;
  return transition.reynolds * viscousLength;
}
