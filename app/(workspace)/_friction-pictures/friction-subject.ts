import { numberOf } from "@/lib/evaluation/document/number-input";
import type { MethodInput } from "@/lib/evaluation/document/schema";
import { frictionResult } from "@/lib/evaluation/methods/friction-result";
import { ductCase, type FrictionCase, type FrictionSetup, plateCase } from "@/lib/evaluation/methods/friction-setup";
import { frictionLinesOf } from "@/lib/evaluation/methods/friction-versions";
import { localStream, type StreamState } from "@/lib/evaluation/methods/stream-state";

/** A surface with its boundary layer, as the pictures draw it. */
export interface FrictionSubject {
  friction: FrictionCase;
  setup: FrictionSetup;
  /** As the surface sees it. */
  stream: StreamState;
  meanCoefficient: number;
}

/** What there is to draw of an item; nothing where its method has no layer or refuses it. */
export function frictionSubject(version: number, input: MethodInput, stream: StreamState): FrictionSubject | null {
  const seen = caseAndStream(version, input, stream);
  if (!seen) return null;
  const result = frictionResult(seen.friction, seen.stream, 1);
  if (result.outcome === "refused") return null;
  return { ...seen, setup: result.setup, meanCoefficient: result.answer.meanCoefficient ?? 0 };
}

function caseAndStream(version: number, input: MethodInput, stream: StreamState) {
  if (input.method === "flat-plate-friction") {
    return {
      friction: plateCase(input, frictionLinesOf(version)),
      stream: localStream(stream, numberOf(input.localSpeedRatio)),
    };
  }
  return input.method === "duct-entry" ? { friction: ductCase(input, frictionLinesOf(version)), stream } : null;
}
