import type { MethodInput, StreamInput } from "../document/schema";
import { fluidSteps } from "./fluid-steps";
import { frictionLinesOf } from "./friction-versions";
import { evaluateMethod } from "./method-registry";
import { ductSteps } from "./duct-steps";
import { bluffBodySteps, dragAreaSteps, fixedSteps, flatPlateSteps, lossSteps, measuredSteps } from "./method-steps";
import { ofMethod } from "./of-method";
import { streamStateOf, type StreamState } from "./stream-state";
import type { WorkedStep } from "./worked-step";

export type { WorkedStep } from "./worked-step";

type Stepper = (input: MethodInput, stream: StreamState) => WorkedStep[];

const STEPPERS: ReadonlyMap<string, Stepper> = new Map([
  ...[1, 2].flatMap((version) => frictionSteppers(version)),
  ["loss-coefficient/1", ofMethod("loss-coefficient", lossSteps)],
  ["bluff-body/1", ofMethod("bluff-body", bluffBodySteps)],
  ["drag-area/1", ofMethod("drag-area", dragAreaSteps)],
  ["measured/1", ofMethod("measured", measuredSteps)],
  ["fixed/1", ofMethod("fixed", fixedSteps)],
]);

/** These need the viscosity of the stream besides its density; a fixed force needs neither. */
const VISCOUS_METHODS = ["flat-plate-friction", "duct-entry"];

/**
 * The calculation of one item as a hand calculator can repeat it; the last value is the drag. A refused item has no steps,
 * and neither has a share, whose calculation is its members'.
 */
export function workedSteps(method: string, version: number, input: MethodInput, point: StreamInput): WorkedStep[] {
  if (method === "share") return [];
  const stream = streamStateOf(point);
  if (evaluateMethod(method, version, input, stream).outcome === "refused") return [];
  const steps = STEPPERS.get(`${method}/${version}`);
  if (!steps) throw new RangeError(`no worked steps of ${method} of version ${version}`);
  return [...fluidStepsFor(method, point), ...steps(input, stream)];
}

function fluidStepsFor(method: string, point: StreamInput): WorkedStep[] {
  if (method === "fixed") return [];
  const { density, viscosity } = fluidSteps(point);
  return VISCOUS_METHODS.includes(method) ? [...density, ...viscosity] : density;
}

function frictionSteppers(version: number): [string, Stepper][] {
  const lines = frictionLinesOf(version);
  return [
    [
      `flat-plate-friction/${version}`,
      ofMethod("flat-plate-friction", (input, stream) => flatPlateSteps(input, stream, lines)),
    ],
    [`duct-entry/${version}`, ofMethod("duct-entry", (input, stream) => ductSteps(input, stream, lines))],
  ];
}
