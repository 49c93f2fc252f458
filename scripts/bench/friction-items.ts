import { admissibleRoughness } from "@/lib/aero/admissible-roughness";
import {
  ROUGHNESS_COEFFICIENT,
  shapeFactorAt,
  stateAtReynoldsTheta,
  thicknessRatioAt,
} from "@/lib/aero/friction/wall-and-wake";
import type { InputOf } from "@/lib/evaluation/document/schema";
import { evaluateMethod } from "@/lib/evaluation/methods/method-registry";
import { bestTimes } from "./processor-time";

const ITEMS = 10_000;
const ROUNDS = 9;
/** Times that a loop is run in one timing: the clock of the processor ticks in milliseconds. */
const PASSES = 20;
const CRITICAL = 5e5;
const ROUGHNESS = 1e-5;
const STREAM = { density: 1.2, dynamicViscosity: 1.8e-5, kinematicViscosity: 1.5e-5, dynamicPressure: 375, speed: 25 };

type LineName = "prandtl-schlichting" | "one-fifth-law" | "momentum-integral";

/** Mean and local coefficient as they are printed, without ranges, names and joints. */
const BARE = {
  "prandtl-schlichting": {
    mean: (re: number) => 0.455 / Math.log10(re) ** 2.58,
    local: (re: number) => (0.455 / Math.log10(re) ** 2.58) * (1 - 2.58 / Math.log(re)),
  },
  "one-fifth-law": { mean: (re: number) => 0.074 * re ** -0.2, local: (re: number) => 0.0592 * re ** -0.2 },
};

/** Milliseconds of 10,000 plates, notes and all, and of a bare loop over the same formulas; by closed-form line. */
export function frictionItemTimes() {
  return {
    "prandtl-schlichting": bestTimes(
      { items: () => itemsLoop("prandtl-schlichting"), bare: () => bareLoop("prandtl-schlichting", borrowedProfile) },
      ROUNDS,
    ),
    "one-fifth-law": bestTimes(
      { items: () => itemsLoop("one-fifth-law"), bare: () => bareLoop("one-fifth-law", powerProfile) },
      ROUNDS,
    ),
  };
}

function lengthOf(index: number): number {
  return 0.5 + index / 1000;
}

function inputsOf(frictionLine: LineName): InputOf<"flat-plate-friction">[] {
  return Array.from({ length: ITEMS }, (_, index) => ({
    method: "flat-plate-friction",
    length: lengthOf(index),
    breadth: 0.5,
    faces: 2,
    runUp: 0,
    roughness: ROUGHNESS,
    transition: { kind: "natural", criticalReynolds: CRITICAL },
    frictionLine,
    localSpeedRatio: 1,
    formFactor: 1,
  }));
}

const INPUTS = new Map<LineName, InputOf<"flat-plate-friction">[]>();

function itemsLoop(line: LineName): number {
  const inputs = INPUTS.get(line) ?? inputsOf(line);
  INPUTS.set(line, inputs);
  let sum = 0;
  for (let pass = 0; pass < PASSES; pass += 1) {
    for (const input of inputs) {
      const outcome = evaluateMethod("flat-plate-friction", 1, input, STREAM);
      if (outcome.outcome === "answer") sum += outcome.answer.drag + outcome.answer.notes.length;
    }
  }
  return sum;
}

type Profile = (reynoldsTheta: number, roughnessReynolds: number) => { thickness: number; displacement: number };

function bareLoop(line: keyof typeof BARE, profile: Profile): number {
  const { speed, kinematicViscosity, dynamicPressure } = STREAM;
  const formulas = BARE[line];
  const replaced = CRITICAL * formulas.mean(CRITICAL) - 1.328 * Math.sqrt(CRITICAL);
  const viscousLength = kinematicViscosity / speed;
  let sum = 0;
  for (let turn = 0; turn < PASSES * ITEMS; turn += 1) {
    const length = lengthOf(turn % ITEMS);
    const reynolds = (speed * length) / kinematicViscosity;
    const local = formulas.local(reynolds);
    const integral = reynolds * formulas.mean(reynolds) - replaced;
    const roughnessReynolds = (speed * ROUGHNESS) / kinematicViscosity;
    const theta = (integral / 2) * viscousLength;
    const { thickness, displacement } = profile(integral / 2, roughnessReynolds);
    const drag = dynamicPressure * 2 * 0.5 * integral * viscousLength;
    const isAdmissible = ROUGHNESS <= admissibleRoughness(speed, kinematicViscosity);
    const plus = roughnessReynolds * Math.sqrt(local / 2);
    sum += drag + theta * (thickness + displacement) + dynamicPressure * local + plus + (isAdmissible ? 1 : 0);
  }
  return sum;
}

function borrowedProfile(reynoldsTheta: number, roughnessReynolds: number) {
  const state = stateAtReynoldsTheta(reynoldsTheta, ROUGHNESS_COEFFICIENT * roughnessReynolds);
  return { thickness: thicknessRatioAt(state), displacement: shapeFactorAt(state) };
}

function powerProfile() {
  return { thickness: 72 / 7, displacement: 9 / 7 };
}
