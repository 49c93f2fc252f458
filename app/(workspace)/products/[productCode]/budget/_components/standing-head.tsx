import type { PointResult } from "@/lib/evaluation/budget/results";
import { standingSentence } from "@/lib/evaluation/budget/standing-sentence";
import { formatHundredths, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatPercent } from "@/lib/units/format-number";

import { WorkingNumber } from "@/app/(workspace)/products/[productCode]/_components/workings-provider";

/** Where the total stands, in one sentence; the figures behind it open their workings. */
export function StandingHead({ point }: { point: PointResult }) {
  const { totals, limitHundredths, reserveHundredths, standing } = point;
  const isOver = standing === "over";
  const share = Math.abs(totals.margin) / (limitHundredths / 100);
  const ofLimit = `${formatPercent(share, share < 0.001 ? 2 : 1)} of the limit`;

  return (
    <p className="mb-3 flex flex-wrap items-baseline gap-x-3 gap-y-0.5">
      <strong className={`text-xl font-semibold ${isOver ? "text-signal" : ""}`} data-standing={standing}>
        <WorkingNumber figure={isOver ? "margin" : "clearOfReserve"} of="total" number={null} name="Standing">
          {standingSentence(point)}
        </WorkingNumber>
      </strong>
      <span className="text-sm text-ink-2">
        <WorkingNumber figure="margin" of="total" number={null} name="Margin to the limit">
          {isOver ? ofLimit : `${formatNewtonsNumber(totals.margin)} N to the limit, ${ofLimit}`}
        </WorkingNumber>
        {" · reserve "}
        <WorkingNumber figure="reserve" of="total" number={null} name="Reserve">
          {formatHundredths(reserveHundredths)} N
        </WorkingNumber>
        {" · limit "}
        <WorkingNumber figure="limit" of="total" number={null} name="Limit">
          {formatHundredths(limitHundredths)} N
        </WorkingNumber>
      </span>
    </p>
  );
}
