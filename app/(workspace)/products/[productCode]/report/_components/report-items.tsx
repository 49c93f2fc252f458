import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { formatHundredths, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatPercent } from "@/lib/units/format-number";
import { MATURITY_GRADE_NAMES } from "@/lib/vocabulary/grades";

import type { ItemRow } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import type { ReportItem } from "@/app/(workspace)/products/[productCode]/_sheet/report-facts";

/** The items that make most of the total. */
export function GreatestItems({ items }: { items: readonly ReportItem[] }) {
  return (
    <Table caption="The greatest items" narrow="stack">
      <TableHead>
        <Head>Item</Head>
        <Head>Owner</Head>
        <Head>Grade</Head>
        <Head numeric unit="N">
          Predicted
        </Head>
        <Head numeric unit="of the total">
          Share
        </Head>
      </TableHead>
      <tbody>
        {items.map(({ row, share }) => (
          <Row key={row.number}>
            <RowHead label="Item">
              {row.number} {row.name}
            </RowHead>
            <Cell label="Owner">{row.owner}</Cell>
            <Cell label="Grade">{MATURITY_GRADE_NAMES[row.body.grade]}</Cell>
            <Cell numeric label="Predicted, N">
              {formatNewtonsNumber(row.predicted)}
            </Cell>
            <Cell numeric label="Share of the total">
              {formatPercent(share, 1)}
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

/** Items beyond what was given to them. */
export function OverItems({ items }: { items: readonly ItemRow[] }) {
  if (items.length === 0) return <p className="text-ink-2">None.</p>;

  return (
    <Table caption="Items over their allocation" narrow="stack">
      <TableHead>
        <Head>Item</Head>
        <Head>Owner</Head>
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
        {items.map(({ number, name, owner, predicted, allocationHundredths, marginHundredths }) => (
          <Row key={number}>
            <RowHead label="Item">
              {number} {name}
            </RowHead>
            <Cell label="Owner">{owner}</Cell>
            <Cell numeric label="Predicted, N">
              {formatNewtonsNumber(predicted)}
            </Cell>
            <Cell numeric label="Allocation, N">
              {allocationHundredths === null ? "none" : formatHundredths(allocationHundredths)}
            </Cell>
            <Cell numeric label="Margin, N" className="font-semibold text-signal">
              {marginHundredths === null ? "–" : formatHundredths(marginHundredths)}
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
