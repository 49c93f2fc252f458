import { COLEBROOK_RANGE, COLEBROOK_ROUGHEST, colebrookFriction, developedDuctDrag } from "@/lib/aero/colebrook";
import { ductBlockage, hydraulicDiameter, type DuctBlockage } from "@/lib/aero/duct-blockage";
import type { FrictionLines } from "@/lib/aero/friction/friction-lines";
import { within } from "@/lib/aero/range";
import { numberOf } from "../document/number-input";
import type { InputOf } from "../document/schema";
import type { Note } from "../notes/note";
import { makeNote } from "../notes/note-catalogue";
import type { FrictionAnswer } from "./friction-answer";
import { frictionResult } from "./friction-result";
import { ductCase } from "./friction-setup";
import type { MethodOutcome } from "./method-answer";
import type { StreamState } from "./stream-state";

/** From this length over hydraulic diameter the developed value stands beside, even where a core is left. */
const LONG_DUCT = 10;

/** Four walls as plates from the entry, at the entry speed, single pass. */
export function evaluateDuctEntry(
  input: InputOf<"duct-entry">,
  stream: StreamState,
  lines: FrictionLines,
): MethodOutcome {
  const width = numberOf(input.width);
  const height = numberOf(input.height);
  const result = frictionResult(ductCase(input, lines), stream, stream.dynamicPressure * 2 * (width + height));
  if (result.outcome === "refused") return result;

  const { answer } = result;
  const { displacementThickness } = answer;
  const shorterSide = Math.min(width, height);
  if (2 * displacementThickness >= shorterSide) {
    return { outcome: "refused", note: makeNote("duct-blocked", { displacementThickness, shorterSide }) };
  }
  const blockage = ductBlockage(width, height, displacementThickness, stream.speed);
  return {
    outcome: "answer",
    answer: {
      ...answer,
      pressureLoss: answer.drag / (width * height),
      ...blockage,
      notes: [...answer.notes, ...ductNotes(input, stream, answer, blockage)],
    },
  };
}

function ductNotes(
  input: InputOf<"duct-entry">,
  stream: StreamState,
  answer: FrictionAnswer,
  { coreSpeedAtExit }: DuctBlockage,
): Note[] {
  const shorterSide = Math.min(numberOf(input.width), numberOf(input.height));
  const coreSpeedRatio = coreSpeedAtExit / stream.speed;
  const layersMeet = 2 * answer.thickness >= shorterSide;
  return [
    makeNote("duct-friction-reads-low", { coreSpeedRatio, dynamicPressureExcess: coreSpeedRatio ** 2 - 1 }),
    ...(layersMeet ? [makeNote("layers-meet-in-duct", { thickness: answer.thickness, shorterSide })] : []),
    ...developedNotes(input, stream, answer.drag, layersMeet),
  ];
}

function developedNotes(input: InputOf<"duct-entry">, stream: StreamState, drag: number, layersMeet: boolean): Note[] {
  const width = numberOf(input.width);
  const height = numberOf(input.height);
  const diameter = hydraulicDiameter(width, height);
  const lengthOverDiameter = numberOf(input.length) / diameter;
  const reynolds = (stream.speed * diameter) / stream.kinematicViscosity;
  const relativeRoughness = numberOf(input.roughness) / diameter;
  const holds = within(reynolds, COLEBROOK_RANGE) && relativeRoughness <= COLEBROOK_ROUGHEST;
  if ((!layersMeet && lengthOverDiameter < LONG_DUCT) || !holds) return [];
  const factor = colebrookFriction(reynolds, relativeRoughness);
  const developedDrag = developedDuctDrag(factor, lengthOverDiameter, stream.dynamicPressure, width * height);
  return [makeNote("fully-developed-cross-check", { lengthOverDiameter, developedDrag, drag })];
}
