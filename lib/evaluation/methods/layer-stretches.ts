import { isBeyond } from "@/lib/aero/friction/transition";
import { numberOf } from "../document/number-input";
import type { MethodInput } from "../document/schema";
import { ductCase, frictionSetup, plateCase, type FrictionCase, type FrictionSetup } from "./friction-setup";
import { frictionLinesOf } from "./friction-versions";
import { localStream, type StreamState } from "./stream-state";

/** A part of a surface with one regime; `from` and `to` in m from the start of the layer. */
export interface LayerStretch {
  from: number;
  to: number;
  regime: "laminar" | "turbulent";
}

/** Regime by stretch over a plate or a duct's walls, from its run-up to its end; nothing for other methods. */
export function layerStretches(version: number, input: MethodInput, stream: StreamState): LayerStretch[] {
  if (input.method === "flat-plate-friction") {
    return stretchesOf(
      plateCase(input, frictionLinesOf(version)),
      localStream(stream, numberOf(input.localSpeedRatio)),
    );
  }
  return input.method === "duct-entry" ? stretchesOf(ductCase(input, frictionLinesOf(version)), stream) : [];
}

function stretchesOf(friction: FrictionCase, stream: StreamState): LayerStretch[] {
  const setup = frictionSetup(friction, stream);
  const from = friction.runUp;
  const to = friction.runUp + friction.length;
  const laminarReynolds = laminarTo(setup);
  if (!isBeyond(setup.endReynolds, laminarReynolds)) return [{ from, to, regime: "laminar" }];
  const change = laminarReynolds * setup.viscousLength;
  if (change <= from) return [{ from, to, regime: "turbulent" }];
  return [
    { from, to: change, regime: "laminar" },
    { from: change, to, regime: "turbulent" },
  ];
}

/** Re to which the layer is laminar as asked; friction may be Blasius's further, to where the line crosses it. */
function laminarTo({ transition }: FrictionSetup): number {
  if (transition.kind === "never") return Infinity;
  return transition.kind === "at" ? transition.reynolds : 0;
}
