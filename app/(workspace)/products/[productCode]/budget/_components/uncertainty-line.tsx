import type { Route } from "next";
import Link from "next/link";

import type { SheetData } from "@/lib/budget/sheet-data";
import { formatNewtons, formatNewtonsNumber } from "@/lib/units/format-newtons";

import { ExceedanceWords } from "@/app/(workspace)/products/[productCode]/_components/exceedance-words";
import { WorkingNumber } from "@/app/(workspace)/products/[productCode]/_components/workings-provider";

interface UncertaintyLineProps {
  sheet: Pick<SheetData, "rows" | "uncertainty">;
  /** The sheet that says more. */
  href: string;
}

/** How far the total may lie from what is printed, in one line. */
export function UncertaintyLine({ sheet: { rows, uncertainty }, href }: UncertaintyLineProps) {
  if (!rows.some(({ kind }) => kind === "item")) return null;
  // A sum of values that are exact has no interval.
  const known = uncertainty !== null && uncertainty.basic.standardUncertainty > 0 ? uncertainty : null;

  return (
    <p className="mb-3 text-sm text-ink-2" data-uncertainty>
      {known !== null ? (
        <>
          <WorkingNumber figure="interval" of="total" number={null} name="95 % interval of ΣB">
            ΣB from {formatNewtonsNumber(known.basic.low95)} to {formatNewtons(known.basic.high95)}
          </WorkingNumber>
          {" with 95 % probability · "}
          <ExceedanceWords frozen={known} />
        </>
      ) : (
        "No interval is known of ΣB"
      )}
      {" · "}
      <Link className="link whitespace-nowrap print:hidden" href={href as Route}>
        {known !== null ? "Causes and runs" : "Why"}
      </Link>
    </p>
  );
}
