import type { Route } from "next";
import Link from "next/link";

import { Notice } from "@/app/_components/notice";
import { SectionHeading } from "@/app/_components/section-heading";
import type { AllocationsView } from "@/lib/evaluation/budget/allocations-view";
import { isKept, type Reading, readText } from "@/lib/evaluation/measures/reading";
import { formatHundredths } from "@/lib/units/format-newtons";

import { WorkingNumber } from "@/app/(workspace)/products/[productCode]/_components/workings-provider";

interface ConservationLineProps {
  sums: Omit<AllocationsView, "lines">;
  /** Of the reference operating point, where allocations are set. */
  reading: Reading;
  /** Where the reserve's history stands. */
  reserveHref: string;
}

/**
 * Allocations, unallocated and reserve against the limit: the sum that must hold after every act. It holds in newtons
 * to 0.01 N, so newtons stand first in every measure.
 */
export function ConservationLine({ sums, reading, reserveHref }: ConservationLineProps) {
  const parts = [
    { sign: "", label: "allocated", value: sums.allocatedHundredths, figure: null },
    { sign: "+", label: "unallocated", value: sums.unallocatedHundredths, figure: "unallocated" },
    { sign: "+", label: "reserve", value: sums.reserveHundredths, figure: null },
    { sign: "=", label: `limit at ${sums.operatingPoint}`, value: sums.limitHundredths, figure: null },
  ] as const;

  return (
    <section aria-labelledby="conservation" className="mt-7">
      <SectionHeading id="conservation">What is given out</SectionHeading>
      <dl className="flex flex-wrap items-baseline gap-x-4 gap-y-2">
        {parts.map(({ sign, label, value, figure }) => (
          <div key={label} className="flex items-baseline gap-x-2">
            {sign ? (
              <span aria-hidden className="text-lg text-ink-2">
                {sign}
              </span>
            ) : null}
            <dt className="order-2 text-sm text-ink-2">{label}</dt>
            <dd className="text-lg font-semibold whitespace-nowrap" data-conservation={label.split(" ")[0]}>
              {figure ? (
                <WorkingNumber figure={figure} of="total" number={null} name="Unallocated">
                  {formatHundredths(value)} N
                </WorkingNumber>
              ) : (
                `${formatHundredths(value)} N`
              )}
              {label === "reserve" ? (
                <Link href={reserveHref as Route} className="link ml-2 text-sm font-normal print:hidden">
                  its history
                </Link>
              ) : null}
              {isKept(reading) ? null : (
                <span className="block text-sm font-normal text-ink-2">{readText(reading, value / 100)}</span>
              )}
            </dd>
          </div>
        ))}
      </dl>
      {sums.isConserved ? null : (
        <div className="mt-3">
          <Notice kind="refusal">
            These do not add up to the limit, or the members of a group hold more than its ceiling. Nothing that was
            approved can bring that about: tell the administrator.
          </Notice>
        </div>
      )}
    </section>
  );
}
