import { roundStored } from "@/lib/units/rounding";
import type { MethodAnswer } from "../methods/method-answer";
import type { Note } from "../notes/note";

type NumericField = {
  [Field in keyof MethodAnswer]-?: MethodAnswer[Field] extends number | undefined ? Field : never;
}[keyof MethodAnswer];

/** Every numeric field of an answer: the compiler asks for a new one here. */
const NUMERIC: Record<NumericField, true> = {
  drag: true,
  reynolds: true,
  meanCoefficient: true,
  localCoefficient: true,
  transitionAt: true,
  thickness: true,
  displacementThickness: true,
  momentumThickness: true,
  wallShearStress: true,
  admissibleRoughness: true,
  roughnessReynolds: true,
  coreSpeedAtExit: true,
  blockedAreaFraction: true,
  pressureLoss: true,
  exitWidthForConstantCore: true,
  exitHeightForConstantCore: true,
  dragArea: true,
  standardUncertainty: true,
};

/** An answer as it is stored and hashed: 12 significant digits everywhere. */
export function roundAnswer(answer: MethodAnswer): MethodAnswer {
  const rounded: MethodAnswer = { ...answer, notes: answer.notes.map(roundNote) };
  for (const field of numericFields()) {
    const value = rounded[field];
    if (value !== undefined) rounded[field] = roundStored(value);
  }
  return rounded;
}

export function roundNote(note: Note): Note {
  const values = Object.entries(note.values).map(([name, value]) => [
    name,
    typeof value === "number" ? roundStored(value) : value,
  ]);
  return { ...note, values: Object.fromEntries(values) };
}

function isNumericField(name: string): name is NumericField {
  return name in NUMERIC;
}

function numericFields(): NumericField[] {
  return Object.keys(NUMERIC).filter(isNumericField);
}
