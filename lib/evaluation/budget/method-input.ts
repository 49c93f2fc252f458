import type { FrictionLineChoice } from "@/lib/aero/friction/friction-line-name";
import type { NumberInput } from "../document/number-input";
import type { FluidInput, InputOf, MethodInput, StreamInput, TransitionInput } from "../document/schema";
import type { Fluid } from "../lines/fluids";
import type { ItemBody } from "../lines/item-body";
import type { OperatingPointBody } from "../lines/operating-point-body";
import type { Quantity } from "../lines/quantity";
import type { IndexedState } from "./indexed-state";
import { runUpOf } from "./run-up";

/** A share has no input of its own kind: it needs the results of others. */
export type EvaluatedBody = Exclude<ItemBody, { method: "share" }>;

/** What the method of an item reads: its fields with finish, run-up and the product's flow area filled in. */
export function methodInputOf(body: EvaluatedBody, state: IndexedState): MethodInput {
  switch (body.method) {
    case "flat-plate-friction":
      return flatPlateInput(body, state);
    case "duct-entry":
      return {
        method: body.method,
        width: numberInput(body.width),
        height: numberInput(body.height),
        length: numberInput(body.length),
        ...frictionInput(body, state),
      };
    case "loss-coefficient":
      return {
        method: body.method,
        lossCoefficient: withSpread(body.lossCoefficient, body.coefficientUncertainty),
        flowArea: numberInput(body.flowArea ?? demand(state.terms.flowArea, "the product's flow area")),
        localSpeedRatio: body.localSpeedRatio,
      };
    case "bluff-body":
      return {
        method: body.method,
        dragCoefficient: withSpread(body.dragCoefficient, body.coefficientUncertainty),
        referenceArea: numberInput(body.referenceArea),
        shelterFactor: body.shelterFactor,
        localSpeedRatio: body.localSpeedRatio,
      };
    case "drag-area":
      return {
        method: body.method,
        dragArea: numberInput(body.dragArea),
        localSpeedRatio: body.localSpeedRatio,
        saving: body.saving,
      };
    case "measured":
      return { method: body.method, force: numberInput(body.force), testPoint: testPoint(body), saving: body.saving };
    case "fixed":
      return { method: body.method, force: numberInput(body.force), saving: body.saving };
  }
}

/** What the formulas of a fluid read. */
export function streamInputOf(point: OperatingPointBody): StreamInput {
  const input = fluidInput({ ...point });
  if (input.fluid !== "air" || point.relativeHumidity === null) return input;
  return { ...input, relativeHumidity: withSpread(point.relativeHumidity, point.humidityUncertainty) };
}

function flatPlateInput(
  body: Extract<ItemBody, { method: "flat-plate-friction" }>,
  state: IndexedState,
): InputOf<"flat-plate-friction"> {
  return {
    method: body.method,
    length: numberInput(body.length),
    breadth: numberInput(body.breadth),
    faces: body.faces,
    runUp: body.runUpFollows ? runUpOf(body, state.items) : numberInput(body.runUp),
    ...frictionInput(body, state),
    localSpeedRatio: body.localSpeedRatio,
    formFactor: body.formFactor,
  };
}

interface FrictionBody {
  finish: string | null;
  roughness: Quantity | null;
  transition: "natural" | "tripped" | "laminar";
  criticalReynolds: number;
  trippedAt: Quantity;
  frictionLine: FrictionLineChoice;
}

function frictionInput(body: FrictionBody, state: IndexedState) {
  const finish = body.finish === null ? null : demand(state.finishes.get(body.finish), `finish ${body.finish}`);
  return {
    roughness: numberInput(demand(finish?.roughness ?? body.roughness, "a roughness")),
    transition: transitionInput(body),
    frictionLine: body.frictionLine,
  };
}

function transitionInput({ transition, criticalReynolds, trippedAt }: FrictionBody): TransitionInput {
  if (transition === "natural") return { kind: transition, criticalReynolds };
  return transition === "tripped" ? { kind: transition, at: numberInput(trippedAt) } : { kind: transition };
}

function testPoint(body: Extract<ItemBody, { method: "measured" }>): FluidInput {
  return fluidInput({
    fluid: body.testFluid,
    staticTemperature: body.testTemperature,
    staticPressure: body.testPressure,
    pressureAltitude: null,
    density: body.testDensity,
    dynamicViscosity: body.testDynamicViscosity,
    speed: body.testSpeed,
  });
}

interface FluidFields {
  fluid: Fluid;
  staticTemperature: Quantity | null;
  staticPressure: Quantity | null;
  pressureAltitude: Quantity | null;
  density: Quantity | null;
  dynamicViscosity: Quantity | null;
  speed: Quantity;
}

function fluidInput(fields: FluidFields): FluidInput {
  const speed = numberInput(fields.speed);
  switch (fields.fluid) {
    case "air":
      return {
        fluid: fields.fluid,
        speed,
        ...(fields.staticTemperature && { staticTemperature: numberInput(fields.staticTemperature) }),
        ...(fields.staticPressure && { staticPressure: numberInput(fields.staticPressure) }),
        ...(fields.pressureAltitude && { pressureAltitude: numberInput(fields.pressureAltitude) }),
      };
    case "fresh-water":
    case "sea-water":
      return {
        fluid: fields.fluid,
        speed,
        staticTemperature: numberInput(demand(fields.staticTemperature, "a temperature")),
      };
    case "custom":
      return {
        fluid: fields.fluid,
        speed,
        density: numberInput(demand(fields.density, "a density")),
        dynamicViscosity: numberInput(demand(fields.dynamicViscosity, "a viscosity")),
      };
  }
}

function numberInput({ value, standardUncertainty }: Quantity): NumberInput {
  return withSpread(value, standardUncertainty ?? null);
}

function withSpread(value: number, standardUncertainty: number | null): NumberInput {
  return standardUncertainty === null ? value : { value, standardUncertainty };
}

/** A body that passed its schema has it: what is missing here is a fault of the program. */
function demand<T>(value: T | null | undefined, name: string): T {
  if (value === null || value === undefined) throw new RangeError(`${name} is missing`);
  return value;
}
