import { blasiusFrictionIntegral } from "@/lib/aero/friction/blasius";
import { FRICTION_LINES } from "@/lib/aero/friction/friction-lines";
import { isBeyond } from "@/lib/aero/friction/transition";
import type { FrictionSetup } from "./friction-setup";
import { digits, step } from "./step-text";
import type { WorkedStep } from "./worked-step";

const LINE = FRICTION_LINES["momentum-integral"];

/** The momentum integral at one place: the Re from a virtual start that keeps θ continuous, λ there, and Re_θ of λ. */
export function integralSteps(
  setup: FrictionSetup,
  reynolds: number,
  re: string,
  g: string,
  place: string,
): WorkedStep[] {
  const { layer, transition, roughnessReynolds } = setup;
  const { reynoldsOf, localCoefficient } = LINE.turbulentLayer(roughnessReynolds);
  const steps: WorkedStep[] = [];
  let virtual = reynolds;
  if (transition.kind === "at" && isBeyond(reynolds, transition.reynolds) && reynoldsOf) {
    const laminar = blasiusFrictionIntegral(transition.reynolds);
    const start = reynoldsOf(laminar);
    virtual = reynolds - transition.reynolds + start;
    steps.push(...virtualStartSteps({ reynolds, transitionReynolds: transition.reynolds, laminar, start }, re, place));
  }
  const lambda = Math.sqrt(2 / localCoefficient(virtual));
  const rough = `(1 + 0.238115 · ${digits(roughnessReynolds)}/${digits(lambda)})`;
  steps.push(
    step(
      [`Velocity ratio U/u_τ at ${place}`, "λ", "–"],
      "Re_x(λ) = ∫ λ² dRe_θ",
      `Re_x = ${digits(virtual)}, Re_k = ${digits(roughnessReynolds)}`,
      lambda,
      { source: LINE.source, range: "Re 10⁶ to 10⁹" },
    ),
    step(
      [`Friction integral at ${place}, ${LINE.title}`, g, "–"],
      `${g} = 2 Re_θ = 2 K e^(κλ) (1 + c Re_k/λ) (A − C/λ)`,
      `2 · 0.0428521 · e^(0.41 · ${digits(lambda)}) · ${rough} · (3.78049 − 24.9981/${digits(lambda)})`,
      layer.frictionIntegral(reynolds),
    ),
  );
  return steps;
}

interface VirtualStart {
  reynolds: number;
  transitionReynolds: number;
  laminar: number;
  start: number;
}

function virtualStartSteps(
  { reynolds, transitionReynolds, laminar, start }: VirtualStart,
  re: string,
  place: string,
): WorkedStep[] {
  return [
    step(
      ["Re where a wholly turbulent layer has the θ of transition", "Re_v", "–"],
      "2 Re_θ(Re_v) = 1.328 √Re_tr",
      `2 Re_θ = ${digits(laminar)}`,
      start,
      { source: "momentum integral solved for λ" },
    ),
    step(
      [`Re from the virtual start at ${place}`, `${re}_t`, "–"],
      `${re}_t = ${re} − Re_tr + Re_v`,
      `${digits(reynolds)} − ${digits(transitionReynolds)} + ${digits(start)}`,
      reynolds - transitionReynolds + start,
    ),
  ];
}
