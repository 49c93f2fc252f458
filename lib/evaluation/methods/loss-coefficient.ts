import { numberOf } from "../document/number-input";
import type { InputOf } from "../document/schema";
import { streamNotes } from "./stream-notes";
import type { MethodOutcome } from "./method-answer";
import { localStream, type StreamState } from "./stream-state";

/** Pressure loss K·q and force K·q·A, at the local speed. */
export function evaluateLossCoefficient(input: InputOf<"loss-coefficient">, stream: StreamState): MethodOutcome {
  const local = localStream(stream, numberOf(input.localSpeedRatio));
  const pressureLoss = numberOf(input.lossCoefficient) * local.dynamicPressure;
  const drag = pressureLoss * numberOf(input.flowArea);
  return { outcome: "answer", answer: { drag, pressureLoss, notes: streamNotes(local) } };
}
