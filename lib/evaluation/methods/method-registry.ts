import type { MethodInput } from "../document/schema";
import { evaluateBluffBody } from "./bluff-body";
import { evaluateDragArea } from "./drag-area";
import { evaluateDuctEntry } from "./duct-entry";
import { evaluateFixed } from "./fixed";
import { evaluateFlatPlateFriction } from "./flat-plate-friction";
import { evaluateLossCoefficient } from "./loss-coefficient";
import { evaluateMeasured } from "./measured";
import type { MethodOutcome } from "./method-answer";
import { frictionLinesOf } from "./friction-versions";
import { ofMethod } from "./of-method";
import type { StreamState } from "./stream-state";

export type { MethodAnswer, MethodOutcome } from "./method-answer";

type Evaluator = (input: MethodInput, stream: StreamState) => MethodOutcome;

/** By method, then by version: an older one stays here, so that old issues can be computed again. */
const EVALUATORS: ReadonlyMap<string, ReadonlyMap<number, Evaluator>> = new Map([
  ["flat-plate-friction", new Map([1, 2].map((version) => [version, plateOf(version)] as const))],
  ["duct-entry", new Map([1, 2].map((version) => [version, ductOf(version)] as const))],
  ["loss-coefficient", new Map([[1, ofMethod("loss-coefficient", evaluateLossCoefficient)]])],
  ["bluff-body", new Map([[1, ofMethod("bluff-body", evaluateBluffBody)]])],
  ["drag-area", new Map([[1, ofMethod("drag-area", evaluateDragArea)]])],
  ["measured", new Map([[1, ofMethod("measured", evaluateMeasured)]])],
  ["fixed", new Map([[1, ofMethod("fixed", evaluateFixed)]])],
]);

/**
 * One item at one operating point, by every method but `share`, which needs the others' drags.
 *
 * @throws RangeError for a method and version that nobody registered: a fault of the program, not of the input
 */
export function evaluateMethod(
  method: string,
  version: number,
  input: MethodInput,
  stream: StreamState,
): MethodOutcome {
  const evaluate = EVALUATORS.get(method)?.get(version);
  if (!evaluate) throw new RangeError(`no method ${method} of version ${version}`);
  return evaluate(input, stream);
}

function plateOf(version: number): Evaluator {
  const lines = frictionLinesOf(version);
  return ofMethod("flat-plate-friction", (input, stream) => evaluateFlatPlateFriction(input, stream, lines));
}

function ductOf(version: number): Evaluator {
  const lines = frictionLinesOf(version);
  return ofMethod("duct-entry", (input, stream) => evaluateDuctEntry(input, stream, lines));
}
