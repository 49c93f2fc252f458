import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { formatHundredths, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatPercent } from "@/lib/units/format-number";

import type { BudgetSheet, ItemRow } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { isOver } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-filter";

export interface PointRow {
  sheet: BudgetSheet;
  row: ItemRow;
}

/** The item's result at every operating point of the budget. */
export function ResultsTable({ points }: { points: readonly PointRow[] }) {
  return (
    <Table caption="Result at every operating point, in newtons">
      <TableHead>
        <Head>Operating point</Head>
        <Head numeric unit="N">
          Basic
        </Head>
        <Head numeric unit="of basic">
          Growth
        </Head>
        <Head numeric unit="N">
          Growth
        </Head>
        <Head numeric unit="N">
          Predicted
        </Head>
        <Head numeric unit="N">
          Allocation
        </Head>
        <Head numeric unit="N">
          Margin
        </Head>
      </TableHead>
      <tbody>
        {points.map(({ sheet, row }) => (
          <ResultRow key={sheet.point.operatingPoint} sheet={sheet} row={row} />
        ))}
      </tbody>
    </Table>
  );
}

function ResultRow({ sheet: { point, isReference }, row }: PointRow) {
  const { result, allocationHundredths, marginHundredths } = row;
  const over = isReference && isOver(row);

  return (
    <Row>
      <RowHead>
        {point.operatingPoint} {point.name}
        {isReference ? <span className="block text-xs text-ink-2">reference: allocations are set here</span> : null}
      </RowHead>
      <Cell numeric>{result.refused ? "refused" : formatNewtonsNumber(row.basic)}</Cell>
      <Cell numeric>{formatPercent(result.growthFraction)}</Cell>
      <Cell numeric>{formatNewtonsNumber(row.growth)}</Cell>
      <Cell numeric>{formatNewtonsNumber(row.predicted)}</Cell>
      <Cell numeric>{allocationHundredths === null ? "none" : formatHundredths(allocationHundredths)}</Cell>
      <Cell numeric className={over ? "font-semibold text-signal" : undefined}>
        {marginHundredths === null ? "–" : formatHundredths(marginHundredths)}
        {over ? <span className="block text-xs">over</span> : null}
      </Cell>
    </Row>
  );
}
