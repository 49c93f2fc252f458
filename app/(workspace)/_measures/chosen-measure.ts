import { type MeasureBasis, measuresOffered, missingMeasureSentence } from "@/lib/evaluation/measures/measure-basis";
import { NEWTONS, type Reading, readingOf } from "@/lib/evaluation/measures/reading";
import { MEASURES, type Measure, type Preferences } from "@/lib/vocabulary/measures";

export interface ChosenMeasure {
  measure: Measure;
  units: Preferences["units"];
  offered: Measure[];
  /** Why the measure that the address asks for is not shown. */
  refusal: string | null;
}

/**
 * The measure of a page: what its address asks for, else what the person keeps, else newtons. Several products on one
 * page offer what any of them has.
 */
export function chosenMeasure(
  asked: string | undefined,
  { measure: kept, units }: Preferences,
  bases: readonly MeasureBasis[],
): ChosenMeasure {
  const offered = MEASURES.filter((measure) => bases.some((basis) => measuresOffered(basis).includes(measure)));
  const choice = { units, offered };
  if (asked === undefined) return { ...choice, measure: offered.includes(kept) ? kept : "newtons", refusal: null };

  const known = MEASURES.find((measure) => measure === asked);
  if (known !== undefined && offered.includes(known)) return { ...choice, measure: known, refusal: null };
  return { ...choice, measure: "newtons", refusal: `${refusalOf(asked, known, bases)} Forces are shown instead.` };
}

function refusalOf(asked: string, known: Measure | undefined, bases: readonly MeasureBasis[]): string {
  if (known === undefined) return `“${asked}” is no measure that is known here.`;
  const [only, ...others] = bases;
  if (only === undefined || others.length > 0) return "None of these products has the measure that was asked for.";
  return missingMeasureSentence(known, only);
}

/** How the newtons of one operating point are printed; in newtons where it doesn't have the measure. */
export function readingFor({ measure, units }: Pick<ChosenMeasure, "measure" | "units">, basis: MeasureBasis): Reading {
  return readingOf(measure, basis, units) ?? readingOf("newtons", basis, units) ?? NEWTONS;
}
