import { type ChosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import type { TrendIssue } from "@/lib/budget/views";
import { isKept, readText } from "@/lib/evaluation/measures/reading";
import { formatFixed, formatSignificant } from "@/lib/units/format-number";
import { MEASURE_NAMES } from "@/lib/vocabulary/measures";

interface ComparedTotalsProps {
  trend: readonly TrendIssue[];
  compare: { from: number; to: number };
  operatingPoint: string;
  measure: ChosenMeasure;
}

/** The totals of two compared issues in the chosen measure; the steps between them are told in newtons, which add up. */
export function ComparedTotals({ trend, compare, operatingPoint, measure }: ComparedTotalsProps) {
  const [was, now] = [compare.from, compare.to].map((number) => {
    const issue = trend.find((each) => each.number === number);
    const point = issue?.points.find((each) => each.operatingPoint === operatingPoint);
    return point ? { number, predicted: point.predicted, reading: readingFor(measure, point.basis) } : null;
  });
  if (!was || !now || isKept(was.reading) || was.reading.unit !== now.reading.unit) return null;

  const { decimals, unit } = now.reading;
  const change = now.predicted * now.reading.perNewton - was.predicted * was.reading.perNewton;
  const printed = decimals === null ? formatSignificant(change) : formatFixed(change, decimals);

  return (
    <p className="mt-3 text-sm text-ink-2">
      {MEASURE_NAMES[now.reading.measure]} at {operatingPoint}, each issue by its own stream and terms:{" "}
      {readText(was.reading, was.predicted)} at issue {was.number}, {readText(now.reading, now.predicted)} at issue{" "}
      {now.number}, a change of {change > 0 ? "+" : ""}
      {printed} {unit}. The steps are told in newtons, in which they add up.
    </p>
  );
}
