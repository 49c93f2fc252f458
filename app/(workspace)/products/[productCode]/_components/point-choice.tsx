import type { Route } from "next";
import Link from "next/link";

import type { PointTotals } from "@/lib/evaluation/budget/results";
import { standingSentence } from "@/lib/evaluation/budget/standing-sentence";

interface PointChoiceProps<Point extends PointTotals> {
  points: readonly Point[];
  worstPoint: string;
  chosen: string;
  hrefOf: (operatingPoint: string) => string;
  /** How a force at a point is printed; in newtons where it isn't said. */
  print?: (point: Point, newtons: number) => string;
}

/** The operating points of the budget, the worst named first, each with where it stands. */
export function PointChoice<Point extends PointTotals>({
  points,
  worstPoint,
  chosen,
  hrefOf,
  print,
}: PointChoiceProps<Point>) {
  if (points.length < 2) return null;
  const ordered = points.toSorted(
    (one, other) => Number(other.operatingPoint === worstPoint) - Number(one.operatingPoint === worstPoint),
  );

  return (
    <nav aria-label="Operating point" className="mb-4 flex flex-wrap border-b border-rule-strong print:hidden">
      {ordered.map((point) => (
        <Link
          key={point.operatingPoint}
          href={hrefOf(point.operatingPoint) as Route}
          scroll={false}
          aria-current={point.operatingPoint === chosen ? "true" : undefined}
          className="-mb-px border-b-[3px] border-transparent py-1.5 pr-5 hover:border-b-rule-strong aria-[current=true]:border-b-ink aria-[current=true]:font-semibold"
        >
          {point.operatingPoint} {point.name}
          <span className={`block text-xs font-normal ${point.standing === "over" ? "text-signal" : "text-ink-2"}`}>
            {standingSentence(point, print && ((newtons) => print(point, newtons)))}
            {point.operatingPoint === worstPoint ? ", the worst" : ""}
          </span>
        </Link>
      ))}
    </nav>
  );
}
