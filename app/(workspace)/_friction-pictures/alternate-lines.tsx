import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { AlternateLine } from "@/lib/evaluation/methods/alternate-lines";
import { formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatPercent, formatSignificant } from "@/lib/units/format-number";

interface AlternateLinesProps {
  lines: readonly AlternateLine[];
  caption: string;
}

/** One item by several friction lines, its own marked. */
export function AlternateLines({ lines, caption }: AlternateLinesProps) {
  return (
    <Table caption={caption}>
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
        {lines.map(({ line, title, drag, meanCoefficient, difference, fitsSurface, isItemsOwn }) => (
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
  );
}
