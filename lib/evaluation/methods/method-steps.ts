import type { FrictionLines } from "@/lib/aero/friction/friction-lines";
import { numberOf } from "../document/number-input";
import type { InputOf } from "../document/schema";
import { fluidSteps } from "./fluid-steps";
import { frictionSteps } from "./friction-steps";
import { frictionSetup, plateCase } from "./friction-setup";
import { digits, step, streamSteps } from "./step-text";
import { localStream, streamStateOf, type StreamState } from "./stream-state";
import type { WorkedStep } from "./worked-step";

const DRAG = ["Drag", "D", "N"] as const;

export function flatPlateSteps(
  input: InputOf<"flat-plate-friction">,
  stream: StreamState,
  lines: FrictionLines,
): WorkedStep[] {
  const ratio = numberOf(input.localSpeedRatio);
  const local = localStream(stream, ratio);
  const friction = plateCase(input, lines);
  const steps = [...streamSteps(stream, ratio), ...frictionSteps(friction, frictionSetup(friction, local), local)];
  const factors = [local.dynamicPressure, numberOf(input.faces), numberOf(input.breadth), numberOf(input.formFactor)];
  const stretch = steps.at(-1)?.value ?? 0;
  return [
    ...steps,
    step(
      DRAG,
      "D = q · faces · breadth · form factor · ΔF",
      [...factors, stretch].map(digits).join(" · "),
      product(factors) * stretch,
    ),
  ];
}

export function lossSteps(input: InputOf<"loss-coefficient">, stream: StreamState): WorkedStep[] {
  const ratio = numberOf(input.localSpeedRatio);
  const { dynamicPressure } = localStream(stream, ratio);
  const [loss, area] = [numberOf(input.lossCoefficient), numberOf(input.flowArea)];
  const pressureLoss = loss * dynamicPressure;
  return [
    ...streamSteps(stream, ratio),
    step(["Pressure loss", "Δp", "Pa"], "Δp = K q", `${digits(loss)} · ${digits(dynamicPressure)}`, pressureLoss),
    step(DRAG, "D = Δp · A", `${digits(pressureLoss)} · ${digits(area)}`, pressureLoss * area),
  ];
}

export function bluffBodySteps(input: InputOf<"bluff-body">, stream: StreamState): WorkedStep[] {
  const ratio = numberOf(input.localSpeedRatio);
  const factors = [
    localStream(stream, ratio).dynamicPressure,
    numberOf(input.dragCoefficient),
    numberOf(input.referenceArea),
    numberOf(input.shelterFactor),
  ];
  return [
    ...streamSteps(stream, ratio),
    step(DRAG, "D = q · C_D · A · shelter factor", factors.map(digits).join(" · "), product(factors)),
  ];
}

export function dragAreaSteps(input: InputOf<"drag-area">, stream: StreamState): WorkedStep[] {
  const ratio = numberOf(input.localSpeedRatio);
  const factors = [localStream(stream, ratio).dynamicPressure, numberOf(input.dragArea)];
  return [
    ...streamSteps(stream, ratio),
    step(DRAG, "D = q · (C_D A)", factors.map(digits).join(" · "), product(factors)),
  ];
}

export function measuredSteps(input: InputOf<"measured">, stream: StreamState): WorkedStep[] {
  const test = streamStateOf(input.testPoint);
  const force = numberOf(input.force);
  return [
    ...streamSteps(stream, 1),
    ...fluidSteps(input.testPoint).density.map((each) => ({ ...each, quantity: `${each.quantity}, in the test` })),
    step(
      ["Dynamic pressure of the test", "q_test", "Pa"],
      "q_test = ½ ρ_test U_test²",
      `½ · ${digits(test.density)} · ${digits(test.speed)}²`,
      test.dynamicPressure,
    ),
    step(
      DRAG,
      "D = force · q/q_test",
      `${digits(force)} · ${digits(stream.dynamicPressure)}/${digits(test.dynamicPressure)}`,
      (force * stream.dynamicPressure) / test.dynamicPressure,
    ),
  ];
}

export function fixedSteps(input: InputOf<"fixed">): WorkedStep[] {
  const force = numberOf(input.force);
  return [step(DRAG, "D = force as given", digits(force), force)];
}

function product(factors: readonly number[]): number {
  return factors.reduce((result, factor) => result * factor, 1);
}
