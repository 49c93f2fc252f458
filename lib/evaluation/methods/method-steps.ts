import { numberOf } from "../document/number-input";
import type { InputOf } from "../document/schema";
import { evaluateDuctEntry } from "./duct-entry";
import { frictionSteps } from "./friction-steps";
import { ductCase, frictionSetup, plateCase } from "./friction-setup";
import { digits, step, streamSteps } from "./step-text";
import { localStream, streamStateOf, type StreamState } from "./stream-state";
import type { WorkedStep } from "./worked-step";

const DRAG = ["Drag", "D", "N"] as const;

export function flatPlateSteps(input: InputOf<"flat-plate-friction">, stream: StreamState): WorkedStep[] {
  const ratio = numberOf(input.localSpeedRatio);
  const local = localStream(stream, ratio);
  const friction = plateCase(input);
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

export function ductSteps(input: InputOf<"duct-entry">, stream: StreamState): WorkedStep[] {
  const friction = ductCase(input);
  const steps = [...streamSteps(stream, 1), ...frictionSteps(friction, frictionSetup(friction, stream), stream)];
  const [width, height] = [numberOf(input.width), numberOf(input.height)];
  const stretch = steps.at(-1)?.value ?? 0;
  const drag = stream.dynamicPressure * 2 * (width + height) * stretch;
  return [
    ...steps,
    ...blockageSteps(input, stream, stretch),
    step(
      DRAG,
      "D = q · 2 (W + H) · ΔF",
      `${digits(stream.dynamicPressure)} · 2 · (${digits(width)} + ${digits(height)}) · ${digits(stretch)}`,
      drag,
    ),
  ];
}

function blockageSteps(input: InputOf<"duct-entry">, stream: StreamState, stretch: number): WorkedStep[] {
  const outcome = evaluateDuctEntry(input, stream);
  if (outcome.outcome === "refused") return [];
  const { displacementThickness, coreSpeedAtExit, pressureLoss } = outcome.answer;
  if (displacementThickness === undefined || coreSpeedAtExit === undefined || pressureLoss === undefined) return [];
  const [width, height] = [numberOf(input.width), numberOf(input.height)];
  return [
    step(
      ["Displacement thickness at the exit", "δ*", "m"],
      "δ* = H₁₂ θ, θ = ½ F, by the line's profile",
      `δ* = ${digits(displacementThickness)}`,
      displacementThickness,
    ),
    step(
      ["Core speed at the exit", "U_c", "m/s"],
      "U_c = U · W · H/((W − 2δ*) · (H − 2δ*))",
      `${digits(stream.speed)} · ${digits(width)} · ${digits(height)}/((${digits(width)} − 2 · ` +
        `${digits(displacementThickness)}) · (${digits(height)} − 2 · ${digits(displacementThickness)}))`,
      coreSpeedAtExit,
      { source: "continuity, single pass" },
    ),
    step(
      ["Pressure loss", "Δp", "Pa"],
      "Δp = q · 2 (W + H) · ΔF/(W H)",
      `${digits(stream.dynamicPressure)} · 2 · (${digits(width)} + ${digits(height)}) · ${digits(stretch)}/(${digits(width)} · ` +
        `${digits(height)})`,
      pressureLoss,
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
