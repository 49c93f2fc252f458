import { roundStored } from "@/lib/units/rounding";
import type { MethodAnswer } from "../methods/method-answer";
import type { Note, NoteValues } from "../notes/note";

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

const NUMERIC_FIELDS: readonly NumericField[] = Object.keys(NUMERIC).filter(isNumericField);

/** An answer as it is stored and hashed: 12 significant digits everywhere. */
export function roundAnswer(answer: MethodAnswer): MethodAnswer {
  const rounded: MethodAnswer = { ...answer, notes: answer.notes.map(roundNote) };
  for (const field of NUMERIC_FIELDS) {
    const value = rounded[field];
    if (value !== undefined) rounded[field] = roundStored(value);
  }
  return rounded;
}

export function roundNote({ code, severity, values }: Note): Note {
  const rounded: NoteValues = { ...values };
  for (const name of Object.keys(rounded)) {
    const value = rounded[name];
    if (typeof value === "number") rounded[name] = roundStored(value);
  }
  return { code, severity, values: rounded };
}

function isNumericField(name: string): name is NumericField {
  return name in NUMERIC;
}
