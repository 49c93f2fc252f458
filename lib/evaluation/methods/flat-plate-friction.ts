import type { FrictionLines } from "@/lib/aero/friction/friction-lines";
import { numberOf } from "../document/number-input";
import type { InputOf } from "../document/schema";
import { frictionResult } from "./friction-result";
import { plateCase } from "./friction-setup";
import type { MethodOutcome } from "./method-answer";
import { localStream, type StreamState } from "./stream-state";

/** drag = q · faces · breadth · formFactor · [F(x₀+L) − F(x₀)], at the local speed over the whole run. */
export function evaluateFlatPlateFriction(
  input: InputOf<"flat-plate-friction">,
  stream: StreamState,
  lines: FrictionLines,
): MethodOutcome {
  const local = localStream(stream, numberOf(input.localSpeedRatio));
  const newtonsPerMetre =
    local.dynamicPressure * numberOf(input.faces) * numberOf(input.breadth) * numberOf(input.formFactor);
  const result = frictionResult(plateCase(input, lines), local, newtonsPerMetre);
  return result.outcome === "refused" ? result : { outcome: "answer", answer: result.answer };
}
