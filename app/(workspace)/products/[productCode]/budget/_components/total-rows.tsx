import { Cell, Row, RowHead } from "@/app/_components/table";
import type { PointTotals } from "@/lib/evaluation/budget/results";
import { type Reading, readNumber } from "@/lib/evaluation/measures/reading";
import { toHundredths } from "@/lib/units/rounding";

import { WorkingNumber } from "@/app/(workspace)/products/[productCode]/_components/workings-provider";

const FIGURES = ["basic", "growth", "predicted"] as const;

/** The totals, with savings and, where there are any, without them. */
export function TotalRows({ point: { totals }, reading }: { point: PointTotals; reading: Reading }) {
  const hasSavings = toHundredths(totals.predicted) !== toHundredths(totals.predictedWithoutSavings);

  return (
    <>
      <Row band className="border-t border-ink">
        <RowHead className="font-semibold">{hasSavings ? "Total, savings counted" : "Total"}</RowHead>
        <Cell className="max-sm:hidden" />
        <Cell />
        {FIGURES.map((figure) => (
          <Cell key={figure} numeric>
            <WorkingNumber figure={figure} of="total" number={null} name={`Total, ${figure}`}>
              {readNumber(reading, totals[figure])}
            </WorkingNumber>
          </Cell>
        ))}
        <Cell colSpan={2} />
        <Cell className="max-sm:hidden" />
      </Row>
      {hasSavings ? (
        <Row>
          <RowHead>Total, without savings</RowHead>
          <Cell className="max-sm:hidden" />
          <Cell colSpan={3} />
          <Cell numeric>
            <WorkingNumber figure="predictedWithoutSavings" of="total" number={null} name="Predicted without savings">
              {readNumber(reading, totals.predictedWithoutSavings)}
            </WorkingNumber>
          </Cell>
          <Cell colSpan={2} />
          <Cell className="max-sm:hidden" />
        </Row>
      ) : null}
    </>
  );
}
