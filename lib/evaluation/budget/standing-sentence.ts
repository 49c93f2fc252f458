import { formatNewtons } from "@/lib/units/format-newtons";
import { roundHundredths } from "@/lib/units/rounding";
import type { PointResult, Totals } from "./results";

type StandingFigures = Pick<PointResult, "standing" | "reserveHundredths"> & { totals: Pick<Totals, "margin"> };

/** Where a point stands, in words: "Inside by 1.41 N" is what is clear of the reserve. Decided in newtons to 0.01 N. */
export function standingSentence(
  { standing, totals, reserveHundredths }: StandingFigures,
  print: (newtons: number) => string = formatNewtons,
): string {
  const margin = roundHundredths(totals.margin);
  const clear = roundHundredths(margin - reserveHundredths / 100);
  switch (standing) {
    case "inside":
      return `Inside by ${print(clear)}`;
    case "into_the_reserve":
      return `Into the reserve by ${print(-clear)}`;
    case "over":
      return `Over the limit by ${print(-margin)}`;
  }
}
