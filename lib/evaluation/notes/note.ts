import type { NoteCode, NoteSeverity } from "./note-code";

/** What a result carries besides its numbers. Values only: the sentence is made when it is shown. */
export interface Note {
  code: NoteCode;
  severity: NoteSeverity;
  values: NoteValues;
}

export type NoteValues = Record<string, number | string>;
