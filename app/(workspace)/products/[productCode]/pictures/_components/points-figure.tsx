import { FigureWithTable } from "@/app/_components/figure-with-table";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { BudgetAt } from "@/lib/budget/views";
import type { PointResult } from "@/lib/evaluation/budget/results";
import { standingSentence } from "@/lib/evaluation/budget/standing-sentence";
import { formatHundredths, formatNewtons, formatNewtonsNumber } from "@/lib/units/format-newtons";

import { StavePair } from "@/app/(workspace)/products/[productCode]/_pictures/stave-pair";
import { budgetSheet } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { staveInput } from "@/app/(workspace)/products/[productCode]/_sheet/stave-input";

/** A stave for each operating point, all on one scale. */
export function PointsFigure({ budget }: { budget: BudgetAt }) {
  const { points } = budget.results;
  const staves = points.map((point) => ({
    label: point.operatingPoint,
    input: staveInput(budgetSheet(budget, point)),
    text: `${formatNewtons(point.totals.predicted)} predicted`,
  }));

  return (
    <FigureWithTable
      summary={points.map((point) => `${point.operatingPoint}: ${standingSentence(point)}`).join(". ")}
      picture={<StavePair staves={staves} />}
      caption="Solid: basic, item by item; hatched: growth. Post: limit; dashed post: where the reserve begins. Newtons, one scale."
      table={<PointsTable points={points} />}
    />
  );
}

function PointsTable({ points }: { points: readonly PointResult[] }) {
  return (
    <Table caption="The numbers of the picture, in newtons">
      <TableHead>
        <Head>Operating point</Head>
        <Head numeric>Basic</Head>
        <Head numeric>Growth</Head>
        <Head numeric>Predicted</Head>
        <Head numeric>Reserve</Head>
        <Head numeric>Limit</Head>
        <Head>Standing</Head>
      </TableHead>
      <tbody>
        {points.map((point) => (
          <Row key={point.operatingPoint}>
            <RowHead>
              {point.operatingPoint} {point.name}
            </RowHead>
            {[point.totals.basic, point.totals.growth, point.totals.predicted].map((value, at) => (
              <Cell key={at} numeric>
                {formatNewtonsNumber(value)}
              </Cell>
            ))}
            <Cell numeric>{formatHundredths(point.reserveHundredths)}</Cell>
            <Cell numeric>{formatHundredths(point.limitHundredths)}</Cell>
            <Cell>{standingSentence(point)}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
