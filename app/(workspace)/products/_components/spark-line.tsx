import type { ChosenMeasure } from "@/app/(workspace)/_measures/chosen-measure";
import { readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import { readText } from "@/lib/evaluation/measures/reading";
import type { SparkPoint } from "@/lib/products/register-sheet";

import { sparkLayout } from "../_register/spark-layout";

const WIDTH = 116;
const HEIGHT = 30;
/** Keeps thick lines and the last mark inside. */
const ROOM = 4;

interface SparkLineProps {
  trend: readonly SparkPoint[];
  measure: ChosenMeasure;
}

/** Predicted (water) against the limit (ink) over the issues, at the operating point that stands worst now. */
export function SparkLine({ trend, measure }: SparkLineProps) {
  const [first, last] = [trend.at(0), trend.at(-1)];
  if (!first || !last) return <span className="text-ink-2">–</span>;
  const { predicted, limit } = sparkLayout(trend.map((point) => shown(point, measure)));
  const end = predicted.at(-1);

  return (
    <svg width={WIDTH} height={HEIGHT} role="img" aria-label={sentence(first, last, measure)} className="block">
      <path d={pathOf(limit)} fill="none" strokeWidth="1.5" className="stroke-ink" />
      <path d={pathOf(predicted)} fill="none" strokeWidth="2" className="stroke-water" />
      {end ? <circle cx={x(end.x)} cy={y(end.y)} r="3" className="fill-sheet stroke-water" strokeWidth="2" /> : null}
    </svg>
  );
}

/** Each issue is read by its own terms, so that another reference area doesn't bend the line by itself. */
function shown(point: SparkPoint, measure: ChosenMeasure) {
  const { perNewton } = readingFor(measure, point.basis);
  return { predicted: point.predicted * perNewton, limit: point.limit * perNewton };
}

function sentence(first: SparkPoint, last: SparkPoint, measure: ChosenMeasure): string {
  const text = (point: SparkPoint, newtons: number) => readText(readingFor(measure, point.basis), newtons);
  const now = `${text(last, last.predicted)} at issue ${last.issue}, limit ${text(last, last.limit)}`;
  const where = `Predicted at ${last.operatingPoint}`;
  if (first.issue === last.issue) return `${where}: ${now}.`;
  return `${where}: ${text(first, first.predicted)} at issue ${first.issue}, ${now}.`;
}

function pathOf(points: readonly { x: number; y: number }[]): string {
  return points.map((point, at) => `${at === 0 ? "M" : "L"}${x(point.x)} ${y(point.y)}`).join("");
}

function x(fraction: number): number {
  return Number((ROOM + fraction * (WIDTH - 2 * ROOM)).toFixed(2));
}

function y(fraction: number): number {
  return Number((ROOM + fraction * (HEIGHT - 2 * ROOM)).toFixed(2));
}
