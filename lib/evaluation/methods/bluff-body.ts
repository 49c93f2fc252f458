import { numberOf } from "../document/number-input";
import type { InputOf } from "../document/schema";
import { streamNotes } from "./stream-notes";
import type { MethodOutcome } from "./method-answer";
import { localStream, type StreamState } from "./stream-state";

/** drag = q · C_D · A · shelter factor, at the local speed. */
export function evaluateBluffBody(input: InputOf<"bluff-body">, stream: StreamState): MethodOutcome {
  const local = localStream(stream, numberOf(input.localSpeedRatio));
  const drag =
    local.dynamicPressure *
    numberOf(input.dragCoefficient) *
    numberOf(input.referenceArea) *
    numberOf(input.shelterFactor);
  return {
    outcome: "answer",
    answer: { drag, dragArea: drag / stream.dynamicPressure, notes: streamNotes(local) },
  };
}
