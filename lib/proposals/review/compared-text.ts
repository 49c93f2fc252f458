import { textDiff } from "@/lib/budget/text-diff";
import type { ComparedText } from "../sheet-views";

/** From here on two texts are easier to read line by line than beside each other. */
const LONG = 120;

/** A text that changed, line by line where it is long or has several lines; null for a short one or an equal one. */
export function comparedText(was: string | null, toBe: string | null): ComparedText | null {
  if (was === null || toBe === null || was === toBe || was === "" || toBe === "") return null;
  const isLong = (text: string) => text.length > LONG || text.includes("\n");
  return isLong(was) || isLong(toBe) ? { was, toBe, rows: textDiff(was, toBe) } : null;
}
