import type { Route } from "next";
import Link from "next/link";

import type { PointResult } from "@/lib/evaluation/budget/results";

interface TrendPointsProps {
  points: readonly PointResult[];
  chosen: string;
  hrefOf: (operatingPoint: string) => string;
}

/** At which operating point the trend is drawn. */
export function TrendPoints({ points, chosen, hrefOf }: TrendPointsProps) {
  if (points.length < 2) return null;

  return (
    <nav aria-label="Operating point" className="mb-3 flex flex-wrap gap-x-5 print:hidden">
      {points.map(({ operatingPoint, name }) => (
        <Link
          key={operatingPoint}
          href={hrefOf(operatingPoint) as Route}
          aria-current={operatingPoint === chosen ? "true" : undefined}
          className="py-1 hover:underline aria-[current=true]:font-semibold"
        >
          {operatingPoint} {name}
        </Link>
      ))}
    </nav>
  );
}
