import type { Route } from "next";
import Link from "next/link";

interface PointLinksProps {
  points: readonly { operatingPoint: string; name: string }[];
  chosen: string;
  hrefOf: (operatingPoint: string) => string;
}

/** At which operating point a history is shown. */
export function PointLinks({ points, chosen, hrefOf }: PointLinksProps) {
  if (points.length < 2) return null;

  return (
    <nav aria-label="Operating point" className="mb-3 flex flex-wrap gap-x-5 print:hidden">
      {points.map(({ operatingPoint, name }) => (
        <Link
          key={operatingPoint}
          href={hrefOf(operatingPoint) as Route}
          scroll={false}
          aria-current={operatingPoint === chosen ? "true" : undefined}
          className="py-1 hover:underline aria-[current=true]:font-semibold"
        >
          {operatingPoint} {name}
        </Link>
      ))}
    </nav>
  );
}
