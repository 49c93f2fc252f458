import type { RecomputedDifference } from "@/lib/budget/recomputed-difference";

/** The verdict on a whole issue, all its operating points. */
export function differencesSentence(differences: readonly RecomputedDifference[]): string {
  const [first] = differences;
  if (!first) {
    return "Today’s code, with the method versions that this issue names, gives every number that it keeps, at every operating point, to one part in 10¹⁰.";
  }
  const { operatingPoint, item, quantity, stored, recomputed } = first;
  const subject = item === "" ? "the total" : `item ${item}`;
  const count = differences.length === 1 ? "One number differs" : `${differences.length} numbers differ`;
  return `${count} from what this issue keeps. The first: ${quantity} of ${subject} at ${operatingPoint}, kept as ${stored}, recomputed as ${recomputed}. Tell whoever runs this installation: a result was altered, or the code of a method was.`;
}
