import type { MethodAnswer } from "@/lib/evaluation/methods/method-answer";
import { lineTitle } from "@/lib/evaluation/notes/line-title";
import { formatNewtons } from "@/lib/units/format-newtons";
import { formatPercent, formatSignificant } from "@/lib/units/format-number";
import { formatResult, formatResultIn, formatRoughness, formatThickness } from "@/lib/units/format-quantity";
import type { UnitSystem, UsDimension } from "@/lib/units/us-customary";

interface AnswerField {
  name: string;
  symbol: string;
  text: (answer: MethodAnswer, units: UnitSystem) => string | null;
}

/** Everything a method gives besides the drag, in the order of a hand calculation. */
export const ANSWER_FIELDS: readonly AnswerField[] = [
  { name: "Reynolds number at the end", symbol: "Re", text: number((answer) => answer.reynolds) },
  { name: "Mean coefficient of friction", symbol: "C_F", text: number((answer) => answer.meanCoefficient) },
  { name: "Local coefficient at the end", symbol: "C_f", text: number((answer) => answer.localCoefficient) },
  {
    name: "Friction line",
    symbol: "",
    text: ({ frictionLineUsed }) => (frictionLineUsed === undefined ? null : lineTitle(frictionLineUsed)),
  },
  {
    name: "Transition, from the start of the layer",
    symbol: "x_tr",
    text: shown((answer) => answer.transitionAt, metres),
  },
  { name: "Thickness of the layer", symbol: "δ", text: shown((answer) => answer.thickness, formatThickness) },
  {
    name: "Displacement thickness",
    symbol: "δ*",
    text: shown((answer) => answer.displacementThickness, formatThickness),
  },
  { name: "Momentum thickness", symbol: "θ", text: shown((answer) => answer.momentumThickness, formatThickness) },
  { name: "Wall shear stress", symbol: "τ_w", text: shown((answer) => answer.wallShearStress, pascals) },
  {
    name: "Admissible roughness",
    symbol: "k_adm",
    text: shown((answer) => answer.admissibleRoughness, formatRoughness),
  },
  { name: "Roughness in wall units", symbol: "k_s⁺", text: number((answer) => answer.roughnessReynolds) },
  { name: "Verdict on the surface", symbol: "", text: ({ roughnessVerdict }) => roughnessVerdict ?? null },
  { name: "Core speed at the exit", symbol: "U_c", text: shown((answer) => answer.coreSpeedAtExit, metresPerSecond) },
  {
    name: "Blocked part of the area",
    symbol: "",
    text: shown(
      (answer) => answer.blockedAreaFraction,
      (fraction) => `${formatPercent(fraction, 1)} of the section`,
    ),
  },
  { name: "Pressure loss", symbol: "Δp", text: shown((answer) => answer.pressureLoss, pascals) },
  {
    name: "Exit width that keeps the core speed",
    symbol: "W + 2δ*",
    text: shown((answer) => answer.exitWidthForConstantCore, metres),
  },
  {
    name: "Exit height that keeps the core speed",
    symbol: "H + 2δ*",
    text: shown((answer) => answer.exitHeightForConstantCore, metres),
  },
  {
    name: "Drag area",
    symbol: "C_D·A",
    text: shown((answer) => answer.dragArea, inUnits("area", "m²")),
  },
  { name: "Standard uncertainty", symbol: "u", text: shown((answer) => answer.standardUncertainty, force) },
];

type Pick = (answer: MethodAnswer) => number | undefined;

type Print = (value: number, units: UnitSystem) => string;

function shown(pick: Pick, print: Print): AnswerField["text"] {
  return (answer, units) => {
    const value = pick(answer);
    return value === undefined ? null : print(value, units);
  };
}

function number(pick: Pick) {
  return shown(pick, (value) => formatSignificant(value));
}

function inUnits(dimension: UsDimension, si: string): Print {
  return (value, units) => formatResultIn(units, value, dimension, formatResult(value, si));
}

function metres(value: number, units: UnitSystem): string {
  return inUnits("length", "m")(value, units);
}

function pascals(value: number, units: UnitSystem): string {
  return inUnits("pressure", "Pa")(value, units);
}

function metresPerSecond(value: number, units: UnitSystem): string {
  return inUnits("ductSpeed", "m/s")(value, units);
}

function force(value: number, units: UnitSystem): string {
  return formatResultIn(units, value, "force", formatNewtons(value));
}
