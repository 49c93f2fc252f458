import { BLASIUS_SHAPE_FACTOR } from "@/lib/aero/friction/blasius";
import type { FrictionLines } from "@/lib/aero/friction/friction-lines";
import { START_OF_WALL_AND_WAKE } from "@/lib/aero/friction/wall-and-wake";
import { numberOf } from "../document/number-input";
import type { InputOf } from "../document/schema";
import { evaluateDuctEntry } from "./duct-entry";
import { frictionSteps } from "./friction-steps";
import { ductCase, frictionSetup } from "./friction-setup";
import type { MethodAnswer } from "./method-answer";
import { digits, step, streamSteps } from "./step-text";
import type { StreamState } from "./stream-state";
import type { WorkedStep } from "./worked-step";

export function ductSteps(input: InputOf<"duct-entry">, stream: StreamState, lines: FrictionLines): WorkedStep[] {
  const friction = ductCase(input, lines);
  const steps = [...streamSteps(stream, 1), ...frictionSteps(friction, frictionSetup(friction, stream), stream)];
  const [width, height] = [numberOf(input.width), numberOf(input.height)];
  const stretch = steps.at(-1)?.value ?? 0;
  const drag = stream.dynamicPressure * 2 * (width + height) * stretch;
  return [
    ...steps,
    ...blockageSteps(input, stream, lines, stretch),
    step(
      ["Drag", "D", "N"],
      "D = q · 2 (W + H) · ΔF",
      `${digits(stream.dynamicPressure)} · 2 · (${digits(width)} + ${digits(height)}) · ${digits(stretch)}`,
      drag,
    ),
  ];
}

function blockageSteps(
  input: InputOf<"duct-entry">,
  stream: StreamState,
  lines: FrictionLines,
  stretch: number,
): WorkedStep[] {
  const outcome = evaluateDuctEntry(input, stream, lines);
  if (outcome.outcome === "refused") return [];
  const { momentumThickness, displacementThickness, coreSpeedAtExit, pressureLoss } = outcome.answer;
  if (momentumThickness === undefined || displacementThickness === undefined) return [];
  if (coreSpeedAtExit === undefined || pressureLoss === undefined) return [];
  const [width, height] = [numberOf(input.width), numberOf(input.height)];
  return [
    step(["Momentum thickness at the exit", "θ", "m"], "θ = ½ F(x₀+L)", `½ · ${digits(stretch)}`, momentumThickness),
    shapeFactorStep(lines, outcome.answer.frictionLineUsed, displacementThickness / momentumThickness),
    step(
      ["Displacement thickness at the exit", "δ*", "m"],
      "δ* = H₁₂ θ",
      `${digits(displacementThickness / momentumThickness)} · ${digits(momentumThickness)}`,
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

/** H₁₂ of the profile that the line has, or borrows. */
function shapeFactorStep(
  lines: FrictionLines,
  line: MethodAnswer["frictionLineUsed"],
  shapeFactor: number,
): WorkedStep {
  const quantity = ["Shape factor at the exit", "H₁₂", "–"] as const;
  if (line === "blasius") {
    const source = { source: "profile of Blasius 1908" };
    return step(quantity, "H₁₂ = 1.7208/0.664", "1.7208/0.664", BLASIUS_SHAPE_FACTOR, source);
  }
  if (line !== undefined && lines[line].profile === "one-seventh-power") {
    return step(quantity, "H₁₂ = 9/7", "9/7", 9 / 7, { source: "one-seventh profile: Schlichting, 7th ed. 1979" });
  }
  const lambda = (START_OF_WALL_AND_WAKE * shapeFactor) / (shapeFactor - 1);
  return step(
    quantity,
    "H₁₂ = λ/(λ − C/A), λ from Re_θ = K e^(κλ) (1 + c Re_k/λ) (A − C/λ)",
    `${digits(lambda)}/(${digits(lambda)} − ${digits(START_OF_WALL_AND_WAKE)})`,
    shapeFactor,
    { source: "profile of wall and wake: Coles 1956" },
  );
}
