import { formatSignificant } from "@/lib/units/format-number";
import { blasiusFrictionIntegral } from "@/lib/aero/friction/blasius";
import type { FrictionLine } from "@/lib/aero/friction/friction-line";
import type { FrictionLines } from "@/lib/aero/friction/friction-lines";
import { isBeyond } from "@/lib/aero/friction/transition";
import { frictionBetween } from "@/lib/aero/friction/friction-between";
import type { FrictionCase, FrictionSetup } from "./friction-setup";
import { integralSteps } from "./integral-steps";
import { digits, step } from "./step-text";
import type { StreamState } from "./stream-state";
import type { WorkedStep } from "./worked-step";

/** From the stream to F(x₀+L) − F(x₀), every number on the way. */
export function frictionSteps(friction: FrictionCase, setup: FrictionSetup, stream: StreamState): WorkedStep[] {
  const steps = [...viscositySteps(stream), ...surfaceSteps(friction, setup, stream)];
  const end = friction.runUp + friction.length;
  steps.push(reynoldsStep("Reynolds number at the end", "Re", end, setup.endReynolds, stream));
  steps.push(...placeSteps(friction.lines, setup, setup.endReynolds, ["Re", "G", "x₀+L"]));
  steps.push(frictionLengthStep(setup, setup.endReynolds, "G", "F(x₀+L)", "x₀+L"));
  if (friction.runUp > 0) {
    steps.push(reynoldsStep("Reynolds number at the run-up", "Re₀", friction.runUp, setup.startReynolds, stream));
    steps.push(...placeSteps(friction.lines, setup, setup.startReynolds, ["Re₀", "G₀", "x₀"]));
    steps.push(frictionLengthStep(setup, setup.startReynolds, "G₀", "F(x₀)", "x₀"));
  }
  const stretch = setup.viscousLength * frictionBetween(setup.layer, setup.startReynolds, setup.spanReynolds);
  const ends = [setup.endReynolds, setup.startReynolds].map(
    (re) => setup.viscousLength * (re > 0 ? setup.layer.frictionIntegral(re) : 0),
  );
  steps.push(
    step(["Friction of the stretch", "ΔF", "m"], "ΔF = F(x₀+L) − F(x₀)", ends.map(digits).join(" − "), stretch),
  );
  return steps;
}

function viscositySteps({ kinematicViscosity, dynamicViscosity, density }: StreamState): WorkedStep[] {
  return [
    step(
      ["Kinematic viscosity", "ν", "m²/s"],
      "ν = μ/ρ",
      `${digits(dynamicViscosity)}/${digits(density)}`,
      kinematicViscosity,
    ),
  ];
}

function surfaceSteps(friction: FrictionCase, setup: FrictionSetup, stream: StreamState): WorkedStep[] {
  const { speed, kinematicViscosity } = stream;
  const steps = [
    step(
      ["Admissible roughness", "k_adm", "m"],
      "k_adm = 100 ν/U",
      `100 · ${digits(kinematicViscosity)}/${digits(speed)}`,
      setup.admissibleRoughness,
      { source: "Schlichting, Boundary-Layer Theory, 7th ed. 1979, ch. XXI" },
    ),
  ];
  if (friction.roughness > 0) {
    steps.push(reynoldsStep("Roughness Reynolds number", "Re_k", friction.roughness, setup.roughnessReynolds, stream));
  }
  const { transition } = setup;
  if (transition.kind === "at") {
    steps.push(
      step(
        ["Transition", "x_tr", "m"],
        "x_tr = Re_tr ν/U",
        `${digits(transition.reynolds)} · ${digits(kinematicViscosity)}/${digits(speed)}`,
        transition.reynolds * setup.viscousLength,
      ),
    );
  }
  return steps;
}

function reynoldsStep(quantity: string, symbol: string, length: number, value: number, stream: StreamState) {
  const { speed, kinematicViscosity } = stream;
  const withValues = `${digits(speed)} · ${digits(length)}/${digits(kinematicViscosity)}`;
  return step([quantity, symbol, "–"], `${symbol} = U x/ν`, withValues, value);
}

/** G = Re·C_F at one place of the layer, by the formula in force there. */
function placeSteps(
  lines: FrictionLines,
  setup: FrictionSetup,
  reynolds: number,
  [re, g, place]: readonly [re: string, g: string, place: string],
): WorkedStep[] {
  const { layer, transition } = setup;
  const line = layer.lineAt(reynolds);
  if (line === "blasius") return [blasiusStep(reynolds, re, g, place)];
  const turbulent = lines[line];
  const asFromStart = turbulent.turbulentLayer(setup.roughnessReynolds);
  const hasLaminarStretch = transition.kind === "at" && isBeyond(reynolds, transition.reynolds);
  if (asFromStart.reynoldsOf) return integralSteps(setup, reynolds, re, g, place);
  if (!hasLaminarStretch) return [lineStep(turbulent, setup, reynolds, re, g, place)];

  const wholly = asFromStart.frictionIntegral(reynolds);
  const atTransition = asFromStart.frictionIntegral(transition.reynolds);
  const excess = atTransition - blasiusFrictionIntegral(transition.reynolds);
  return [
    lineStep(turbulent, setup, reynolds, re, `${g}_t`, place),
    lineStep(turbulent, setup, transition.reynolds, "Re_tr", "G_tr", "x_tr"),
    step(
      ["Laminar stretch taken off", "A", "–"],
      "A = G_tr − 1.328 √Re_tr",
      `${digits(atTransition)} − 1.328 · √${digits(transition.reynolds)}`,
      excess,
      { source: "Prandtl 1927, with the exact A of the line" },
    ),
    step(
      [`Friction integral at ${place}`, g, "–"],
      `${g} = ${g}_t − A`,
      `${digits(wholly)} − ${digits(excess)}`,
      layer.frictionIntegral(reynolds),
    ),
  ];
}

function blasiusStep(reynolds: number, re: string, g: string, place: string): WorkedStep {
  return step(
    [`Friction integral at ${place}, laminar`, g, "–"],
    `${g} = ${re} · C_F = 1.328 √${re}`,
    `1.328 · √${digits(reynolds)}`,
    blasiusFrictionIntegral(reynolds),
    { source: "Blasius 1908", range: "Re 10³ to 5 × 10⁵" },
  );
}

function lineStep(
  line: FrictionLine,
  setup: FrictionSetup,
  reynolds: number,
  re: string,
  g: string,
  place: string,
): WorkedStep {
  const value = line.turbulentLayer(setup.roughnessReynolds).frictionIntegral(reynolds);
  const mean = value / reynolds;
  const { min, max } = line.reynoldsRange;
  return step(
    [`Friction integral at ${place}, ${line.title}`, g, "–"],
    `${g} = ${re} · C_F, ${line.formula}`,
    `${digits(reynolds)} · ${digits(mean)}, ${substituted(line, setup, reynolds, mean)}`,
    value,
    { source: line.source, range: `Re ${formatSignificant(min, 1)} to ${formatSignificant(max, 1)}` },
  );
}

/** A line's equation with its numbers put in. */
function substituted(line: FrictionLine, setup: FrictionSetup, reynolds: number, mean: number): string {
  const piece = line.turbulentLayer(setup.roughnessReynolds).pieceAt(reynolds);
  if (piece === "blasius" || piece === "scaled-blasius") return "C_F of Blasius, scaled to join at Re 1e4";
  const ratio = piece === "held" ? 100 : reynolds / setup.roughnessReynolds;
  return line.formula
    .replaceAll("C_F", digits(mean))
    .replace("x/k_s", digits(ratio))
    .replace(/\bRe\b/, digits(reynolds));
}

function frictionLengthStep(setup: FrictionSetup, reynolds: number, g: string, symbol: string, place: string) {
  const integral = setup.layer.frictionIntegral(reynolds);
  return step(
    [`Friction to ${place}, per metre of width and q`, symbol, "m"],
    `${symbol} = ${g} ν/U`,
    `${digits(integral)} · ${digits(setup.viscousLength)}`,
    integral * setup.viscousLength,
  );
}
