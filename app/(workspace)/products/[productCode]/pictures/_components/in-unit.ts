import type { Reading } from "@/lib/evaluation/measures/reading";
import { MEASURE_NAMES } from "@/lib/vocabulary/measures";

/** " in newtons", " in counts", " as a coefficient": what the figures of a picture are. */
export function inUnit({ measure, unit }: Reading): string {
  if (measure === "newtons" && unit === "N") return " in newtons";
  return unit === "" ? ` as a ${MEASURE_NAMES[measure].toLowerCase()}` : ` in ${unit}`;
}
