import type { MethodInput } from "../document/schema";
import { evaluateMethod } from "./method-registry";
import {
  bluffBodySteps,
  dragAreaSteps,
  ductSteps,
  fixedSteps,
  flatPlateSteps,
  lossSteps,
  measuredSteps,
} from "./method-steps";
import { ofMethod } from "./of-method";
import type { StreamState } from "./stream-state";
import type { WorkedStep } from "./worked-step";

export type { WorkedStep } from "./worked-step";

type Stepper = (input: MethodInput, stream: StreamState) => WorkedStep[];

const STEPPERS: ReadonlyMap<string, Stepper> = new Map([
  ["flat-plate-friction/1", ofMethod("flat-plate-friction", flatPlateSteps)],
  ["duct-entry/1", ofMethod("duct-entry", ductSteps)],
  ["loss-coefficient/1", ofMethod("loss-coefficient", lossSteps)],
  ["bluff-body/1", ofMethod("bluff-body", bluffBodySteps)],
  ["drag-area/1", ofMethod("drag-area", dragAreaSteps)],
  ["measured/1", ofMethod("measured", measuredSteps)],
  ["fixed/1", ofMethod("fixed", fixedSteps)],
]);

/**
 * The calculation of one item as a hand calculator can repeat it; the last value is the drag. A refused item has no steps,
 * and neither has a share, whose calculation is its members'.
 */
export function workedSteps(method: string, version: number, input: MethodInput, stream: StreamState): WorkedStep[] {
  if (method === "share") return [];
  if (evaluateMethod(method, version, input, stream).outcome === "refused") return [];
  const steps = STEPPERS.get(`${method}/${version}`);
  if (!steps) throw new RangeError(`no worked steps of ${method} of version ${version}`);
  return steps(input, stream);
}
