import { CIPM_PRESSURES, CIPM_TEMPERATURES } from "@/lib/aero/fluids/humid-air-density";
import { within } from "@/lib/aero/range";
import type { Note } from "../notes/note";
import { makeNote } from "../notes/note-catalogue";
import type { StreamState } from "./stream-state";

const INCOMPRESSIBLE_UP_TO = 0.3;

/** What is to be said of the stream wherever an item's drag follows from it. */
export function streamNotes(stream: StreamState): Note[] {
  return [...machNotes(stream), ...humidAirNotes(stream)];
}

/** Incompressible methods end at Mach 0.3; only fluids with a speed of sound have a Mach number. */
function machNotes({ speed, speedOfSound }: StreamState): Note[] {
  if (speedOfSound === undefined) return [];
  const mach = speed / speedOfSound;
  return mach > INCOMPRESSIBLE_UP_TO ? [makeNote("mach-above-limit", { mach, limit: INCOMPRESSIBLE_UP_TO })] : [];
}

function humidAirNotes({ humidAirAt }: StreamState): Note[] {
  if (!humidAirAt) return [];
  const { staticTemperature, staticPressure } = humidAirAt;
  const holds = within(staticTemperature, CIPM_TEMPERATURES) && within(staticPressure, CIPM_PRESSURES);
  return holds ? [] : [makeNote("humid-air-outside-range", { staticTemperature, staticPressure })];
}
