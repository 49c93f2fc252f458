import type { Route } from "next";
import Link from "next/link";

import { formatNewtons, formatNewtonsNumber } from "@/lib/units/format-newtons";

import { ExceedanceWords } from "@/app/(workspace)/products/[productCode]/_components/exceedance-words";
import { WorkingNumber } from "@/app/(workspace)/products/[productCode]/_components/workings-provider";
import type { BudgetSheet } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { sheetUncertainty } from "@/app/(workspace)/products/[productCode]/_uncertainty/frozen-uncertainty";

interface UncertaintyLineProps {
  sheet: BudgetSheet;
  /** The sheet that says more. */
  href: string;
}

/** How far the total may lie from what is printed, in one line. */
export function UncertaintyLine({ sheet, href }: UncertaintyLineProps) {
  const uncertainty = sheetUncertainty(sheet);
  if (uncertainty.state === "no_items") return null;

  return (
    <p className="mb-3 text-sm text-ink-2" data-uncertainty>
      {uncertainty.state === "known" ? (
        <>
          <WorkingNumber figure="interval" of="total" number={null} name="95 % interval of ΣB">
            ΣB from {formatNewtonsNumber(uncertainty.frozen.basic.low95)} to{" "}
            {formatNewtons(uncertainty.frozen.basic.high95)}
          </WorkingNumber>
          {" with 95 % probability · "}
          <ExceedanceWords frozen={uncertainty.frozen} />
        </>
      ) : (
        "No interval is known of ΣB"
      )}
      {" · "}
      <Link className="link whitespace-nowrap print:hidden" href={href as Route}>
        {uncertainty.state === "known" ? "Causes and runs" : "Why"}
      </Link>
    </p>
  );
}
