import { numberOf } from "../document/number-input";
import type { InputOf } from "../document/schema";
import type { MethodOutcome } from "./method-answer";

/** The force as it is, at every operating point. */
export function evaluateFixed(input: InputOf<"fixed">): MethodOutcome {
  return { outcome: "answer", answer: { drag: numberOf(input.force), notes: [] } };
}
