import { MATURITY_GRADES, type MaturityGrade } from "@/lib/vocabulary/grades";
import type { MethodName } from "../methods/method-name";

/** An item's last estimate of one grade beside the first measured value that followed, N at the reference point. */
export interface EstimateAndTest {
  item: string;
  name: string;
  grade: MaturityGrade;
  /** Of the estimate. */
  method: MethodName;
  estimate: number;
  estimateIssue: number;
  measured: number;
  measuredIssue: number;
}

/** Statistics of (measured − estimate) / |estimate| over pairs of one kind. */
export interface GrowthStatistics {
  pairs: number;
  mean: number;
  /** Sample standard deviation; null of fewer than two pairs. */
  deviation: number | null;
  least: number;
  greatest: number;
}

export interface SuggestedGrowth {
  grade: MaturityGrade;
  present: number;
  statistics: GrowthStatistics | null;
  /** null where there are too few pairs to suggest anything. */
  suggested: number | null;
}

/** Fewer pairs of a grade suggest nothing (judgement). */
export const LEAST_PAIRS = 5;

/** Growth that testing showed, as a fraction of the estimate. */
export function growthOf({ estimate, measured }: Pick<EstimateAndTest, "estimate" | "measured">): number {
  return (measured - estimate) / Math.abs(estimate);
}

/** null of no pairs. */
export function growthStatistics(pairs: readonly EstimateAndTest[]): GrowthStatistics | null {
  const growths = pairs.map(growthOf);
  if (growths.length === 0) return null;

  const mean = sum(growths) / growths.length;
  const squares = sum(growths.map((growth) => (growth - mean) ** 2));
  const deviation = growths.length < 2 ? null : Math.sqrt(squares / (growths.length - 1));
  return { pairs: growths.length, mean, deviation, least: Math.min(...growths), greatest: Math.max(...growths) };
}

/**
 * What growth table the tests so far would suggest: a growth allowance is the growth that is to be expected, so the
 * mean of a grade, not below 0, rounded up to a whole per cent (common practice, no source).
 */
export function suggestGrowth(
  pairs: readonly EstimateAndTest[],
  present: Readonly<Record<MaturityGrade, number>>,
): SuggestedGrowth[] {
  return MATURITY_GRADES.filter((grade) => !isMeasured(grade)).map((grade) => {
    const statistics = growthStatistics(pairs.filter((pair) => pair.grade === grade));
    const enough = statistics !== null && statistics.pairs >= LEAST_PAIRS;
    return { grade, present: present[grade], statistics, suggested: enough ? wholePercent(statistics.mean) : null };
  });
}

export function isMeasured(grade: MaturityGrade): boolean {
  return grade === "measured_like_part" || grade === "measured_actual";
}

/** Rounded up; a trace of binary fractions is no reason for the next per cent. */
function wholePercent(fraction: number): number {
  return Math.max(0, Math.ceil(Number((fraction * 100).toFixed(9)))) / 100;
}

function sum(numbers: readonly number[]): number {
  return numbers.reduce((total, each) => total + each, 0);
}
