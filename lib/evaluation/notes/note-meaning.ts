import type { NoteValues } from "./note";
import type { NoteSeverity } from "./note-code";

/** What one code means wherever it is met. */
export interface NoteMeaning {
  severity: NoteSeverity;
  /** An edited item can be proposed with it only when its owner says why it stands. */
  needsJustification: boolean;
  /** By how much the matter exceeds its measure: a justification is asked for again only where this grew. */
  excess?(values: NoteValues): number;
  /** What, why and what to do. */
  sentence(values: NoteValues): string;
}

type Sentence = (values: NoteValues) => string;

export function information(sentence: Sentence): NoteMeaning {
  return { severity: "information", needsJustification: false, sentence };
}

export function caution(sentence: Sentence, excess?: (values: NoteValues) => number): NoteMeaning {
  return { severity: "caution", needsJustification: true, sentence, excess };
}

export function refusal(sentence: Sentence): NoteMeaning {
  return { severity: "refusal", needsJustification: false, sentence };
}

/** A value of a note as a number; a note that lacks it was made wrongly. */
export function valueOf(values: NoteValues, name: string): number {
  const value = values[name];
  if (typeof value !== "number") throw new TypeError(`a note lacks its number ${name}`);
  return value;
}
