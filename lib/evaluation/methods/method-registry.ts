import type { InputOf, MethodInput } from "../document/schema";
import { evaluateBluffBody } from "./bluff-body";
import { evaluateDragArea } from "./drag-area";
import { evaluateDuctEntry } from "./duct-entry";
import { evaluateFixed } from "./fixed";
import { evaluateFlatPlateFriction } from "./flat-plate-friction";
import { evaluateLossCoefficient } from "./loss-coefficient";
import { evaluateMeasured } from "./measured";
import type { MethodOutcome } from "./method-answer";
import type { MethodName } from "./method-name";
import type { StreamState } from "./stream-state";

export type { MethodAnswer, MethodOutcome } from "./method-answer";

/** A result depends on the version of its method: an older one stays here, so that old issues can be computed again. */
export const CURRENT_METHOD_VERSIONS: Record<MethodName, number> = {
  "flat-plate-friction": 1,
  "duct-entry": 1,
  "loss-coefficient": 1,
  "bluff-body": 1,
  "drag-area": 1,
  measured: 1,
  fixed: 1,
  share: 1,
};

type Evaluator = (input: MethodInput, stream: StreamState) => MethodOutcome;

const EVALUATORS: ReadonlyMap<string, Evaluator> = new Map([
  ["flat-plate-friction/1", forMethod("flat-plate-friction", evaluateFlatPlateFriction)],
  ["duct-entry/1", forMethod("duct-entry", evaluateDuctEntry)],
  ["loss-coefficient/1", forMethod("loss-coefficient", evaluateLossCoefficient)],
  ["bluff-body/1", forMethod("bluff-body", evaluateBluffBody)],
  ["drag-area/1", forMethod("drag-area", evaluateDragArea)],
  ["measured/1", forMethod("measured", evaluateMeasured)],
  ["fixed/1", forMethod("fixed", evaluateFixed)],
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
  const evaluate = EVALUATORS.get(`${method}/${version}`);
  if (!evaluate) throw new RangeError(`no method ${method} of version ${version}`);
  return evaluate(input, stream);
}

function forMethod<M extends MethodName>(
  name: M,
  evaluate: (input: InputOf<M>, stream: StreamState) => MethodOutcome,
): Evaluator {
  return (input, stream) => {
    if (!isOfMethod(input, name)) throw new RangeError(`input of ${input.method} given to ${name}`);
    return evaluate(input, stream);
  };
}

function isOfMethod<M extends MethodName>(input: MethodInput, name: M): input is InputOf<M> {
  return input.method === name;
}
