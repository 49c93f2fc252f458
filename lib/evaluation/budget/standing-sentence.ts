import { formatNewtons } from "@/lib/units/format-newtons";
import { roundHundredths } from "@/lib/units/rounding";
import type { PointResult } from "./results";

/** Where a point stands, in words: "Inside by 1.41 N" is what is clear of the reserve. */
export function standingSentence({
  standing,
  totals,
  reserveHundredths,
}: Pick<PointResult, "standing" | "totals" | "reserveHundredths">): string {
  const margin = roundHundredths(totals.margin);
  const clear = roundHundredths(margin - reserveHundredths / 100);
  switch (standing) {
    case "inside":
      return `Inside by ${formatNewtons(clear)}`;
    case "into_the_reserve":
      return `Into the reserve by ${formatNewtons(-clear)}`;
    case "over":
      return `Over the limit by ${formatNewtons(-margin)}`;
  }
}
