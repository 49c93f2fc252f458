import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { methodInputOf } from "@/lib/evaluation/budget/method-input";
import { alternateLines } from "@/lib/evaluation/methods/alternate-lines";
import { formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatPercent, formatSignificant } from "@/lib/units/format-number";

import type { PointRow } from "./results-table";

/** Every friction line whose range holds this item's Re, side by side: how much the choice of line decides. */
export function AlternateLinesTable({ shown: { sheet, row } }: { shown: PointRow }) {
  if (row.body.method === "share") return null;
  const alternates = alternateLines(methodInputOf(row.body, sheet.indexed), sheet.point.stream);
  if (!alternates) return null;

  return (
    <>
      <SectionHeading aside={`spread ${formatPercent(alternates.spread, 1)} of this item's drag`}>
        By other friction lines at {sheet.point.operatingPoint}
      </SectionHeading>
      <Table caption="The same item by every friction line whose range holds its Reynolds number">
        <TableHead>
          <Head>Line</Head>
          <Head numeric>Mean coefficient</Head>
          <Head numeric unit="N">
            Drag
          </Head>
          <Head numeric unit="of this item's">
            Difference
          </Head>
          <Head>Stands for this surface</Head>
        </TableHead>
        <tbody>
          {alternates.lines.map(({ line, title, drag, meanCoefficient, difference, fitsSurface, isItemsOwn }) => (
            <Row key={line} band={isItemsOwn}>
              <RowHead>
                {title}
                {isItemsOwn ? <span className="ml-2 text-xs text-ink-2">in use</span> : null}
              </RowHead>
              <Cell numeric>{formatSignificant(meanCoefficient)}</Cell>
              <Cell numeric>{formatNewtonsNumber(drag)}</Cell>
              <Cell numeric>{formatPercent(difference, 1)}</Cell>
              <Cell>{fitsSurface ? "yes" : "no"}</Cell>
            </Row>
          ))}
        </tbody>
      </Table>
    </>
  );
}
