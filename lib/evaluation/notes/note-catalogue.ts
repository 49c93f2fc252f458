import type { Note, NoteValues } from "./note";
import type { NoteCode } from "./note-code";
import { CAUTIONS } from "./note-cautions";
import { INFORMATION } from "./note-information";
import type { NoteMeaning } from "./note-meaning";
import { REFUSALS } from "./note-refusals";

/** One table of every code. Adding a code is its name, its row in one of the three parts, and the place that makes it. */
export const NOTE_CATALOGUE: Record<NoteCode, NoteMeaning> = { ...INFORMATION, ...CAUTIONS, ...REFUSALS };

export function makeNote(code: NoteCode, values: NoteValues = {}): Note {
  return { code, severity: NOTE_CATALOGUE[code].severity, values };
}

export function noteSentence({ code, values }: Note): string {
  return NOTE_CATALOGUE[code].sentence(values);
}

/** The measure by which a note exceeds its limit; 1 where its code has none. */
export function noteExcess({ code, values }: Note): number {
  return NOTE_CATALOGUE[code].excess?.(values) ?? 1;
}

export function needsJustification({ code }: Note): boolean {
  return NOTE_CATALOGUE[code].needsJustification;
}
