import type { PointTotals } from "@/lib/evaluation/budget/results";
import { standingSentence } from "@/lib/evaluation/budget/standing-sentence";
import { isKept, type Reading, readText } from "@/lib/evaluation/measures/reading";
import { formatNewtons } from "@/lib/units/format-newtons";
import { formatPercent } from "@/lib/units/format-number";

import { WorkingNumber } from "@/app/(workspace)/products/[productCode]/_components/workings-provider";

/** Where the total stands, in one sentence; the figures behind it open their workings, in the newtons that decide. */
export function StandingHead({ point, reading }: { point: PointTotals; reading: Reading }) {
  const { totals, limitHundredths, reserveHundredths, standing } = point;
  const isOver = standing === "over";
  const share = Math.abs(totals.margin) / (limitHundredths / 100);
  const print = (newtons: number) => readText(reading, newtons);
  const ofLimit = `${formatPercent(share, share < 0.001 ? 2 : 1)} of the limit`;

  return (
    <p className="mb-3 flex flex-wrap items-baseline gap-x-3 gap-y-0.5">
      <strong className={`text-xl font-semibold ${isOver ? "text-signal" : ""}`} data-standing={standing}>
        <WorkingNumber figure={isOver ? "margin" : "clearOfReserve"} of="total" number={null} name="Standing">
          {standingSentence(point, print)}
        </WorkingNumber>
      </strong>
      <span className="text-sm text-ink-2">
        <WorkingNumber figure="margin" of="total" number={null} name="Margin to the limit">
          {isOver ? ofLimit : `${print(totals.margin)} to the limit, ${ofLimit}`}
        </WorkingNumber>
        {" · reserve "}
        <WorkingNumber figure="reserve" of="total" number={null} name="Reserve">
          {print(reserveHundredths / 100)}
        </WorkingNumber>
        {" · limit "}
        <WorkingNumber figure="limit" of="total" number={null} name="Limit">
          {print(limitHundredths / 100)}
        </WorkingNumber>
        {isKept(reading) ? null : ` · in newtons: predicted ${formatNewtons(totals.predicted)}, ${kept(point)}`}
      </span>
    </p>
  );
}

/** "inside by 1.41 N": what was decided stands beside what is read. */
function kept(point: PointTotals): string {
  const sentence = standingSentence(point);
  return sentence.charAt(0).toLowerCase() + sentence.slice(1);
}
