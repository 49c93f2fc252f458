import { numberOf } from "../document/number-input";
import type { InputOf } from "../document/schema";
import { streamNotes } from "./stream-notes";
import type { MethodOutcome } from "./method-answer";
import { localStream, type StreamState } from "./stream-state";

/** drag = q · (C_D·A), at the local speed. */
export function evaluateDragArea(input: InputOf<"drag-area">, stream: StreamState): MethodOutcome {
  const local = localStream(stream, numberOf(input.localSpeedRatio));
  const drag = local.dynamicPressure * numberOf(input.dragArea);
  return {
    outcome: "answer",
    answer: { drag, dragArea: drag / stream.dynamicPressure, notes: streamNotes(local) },
  };
}
