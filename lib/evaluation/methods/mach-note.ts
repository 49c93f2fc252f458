import type { Note } from "../notes/note";
import { makeNote } from "../notes/note-catalogue";
import type { StreamState } from "./stream-state";

const INCOMPRESSIBLE_UP_TO = 0.3;

/** Incompressible methods end at Mach 0.3; only fluids with a speed of sound have a Mach number. */
export function machNotes({ speed, speedOfSound }: StreamState): Note[] {
  if (speedOfSound === undefined) return [];
  const mach = speed / speedOfSound;
  return mach > INCOMPRESSIBLE_UP_TO ? [makeNote("mach-above-limit", { mach, limit: INCOMPRESSIBLE_UP_TO })] : [];
}
