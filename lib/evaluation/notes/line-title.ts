import { FRICTION_LINES } from "@/lib/aero/friction/friction-lines";
import type { NoteValues } from "./note";

const TITLES: ReadonlyMap<unknown, string> = new Map<string, string>([
  ...Object.values(FRICTION_LINES).map(({ name, title }) => [name, title] as const),
  ["automatic", "the automatic choice"],
  ["blasius", "Blasius"],
]);

/** Printed name of the friction line that a note speaks of. */
export function lineTitle(value: NoteValues[string] | undefined): string {
  return TITLES.get(value) ?? String(value);
}
