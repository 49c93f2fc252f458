import { numberOf } from "../document/number-input";
import type { InputOf } from "../document/schema";
import { makeNote } from "../notes/note-catalogue";
import { streamNotes } from "./stream-notes";
import type { MethodOutcome } from "./method-answer";
import { streamStateOf, type StreamState } from "./stream-state";

/** Re that differs by more than this factor from the test's calls for a note. */
const TWOFOLD = 2;

/** drag = force · q / q of the test: the measured drag area carried over. */
export function evaluateMeasured(input: InputOf<"measured">, stream: StreamState): MethodOutcome {
  const test = streamStateOf(input.testPoint);
  const drag = (numberOf(input.force) * stream.dynamicPressure) / test.dynamicPressure;
  const ratio = stream.speed / stream.kinematicViscosity / (test.speed / test.kinematicViscosity);
  const differs = ratio > TWOFOLD || ratio < 1 / TWOFOLD;
  return {
    outcome: "answer",
    answer: {
      drag,
      dragArea: drag / stream.dynamicPressure,
      notes: [...streamNotes(stream), ...(differs ? [makeNote("measured-reynolds-differs", { ratio })] : [])],
    },
  };
}
