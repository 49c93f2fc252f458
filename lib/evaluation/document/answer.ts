import type { MethodAnswer } from "../methods/method-answer";
import type { NoteCode, NoteSeverity } from "../notes/note-code";

/** A note as it is shown. */
export interface ShownNote {
  code: NoteCode;
  severity: NoteSeverity;
  sentence: string;
}

export type ItemAnswer =
  ({ id: string } & Omit<MethodAnswer, "notes"> & { notes: ShownNote[] }) | { id: string; refused: string };

export interface OperatingPointAnswer {
  id: string;
  density: number;
  dynamicViscosity: number;
  kinematicViscosity: number;
  dynamicPressure: number;
  items: ItemAnswer[];
  /** Absent where an item is refused. */
  totalDrag?: number;
}

export interface EvaluationAnswer {
  operatingPoints: OperatingPointAnswer[];
}

export function hasRefusal({ operatingPoints }: EvaluationAnswer): boolean {
  return operatingPoints.some(({ items }) => items.some((item) => "refused" in item));
}
