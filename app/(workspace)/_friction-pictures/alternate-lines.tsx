import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { NEWTONS, type Reading, readNumber } from "@/lib/evaluation/measures/reading";
import type { AlternateLine } from "@/lib/evaluation/methods/alternate-lines";
import { formatPercent, formatSignificant } from "@/lib/units/format-number";

interface AlternateLinesProps {
  lines: readonly AlternateLine[];
  caption: string;
  /** In newtons outside of a budget. */
  reading?: Reading;
}

/** One item by several friction lines, its own marked. */
export function AlternateLines({ lines, caption, reading = NEWTONS }: AlternateLinesProps) {
  return (
    <Table caption={caption}>
      <TableHead>
        <Head>Line</Head>
        <Head numeric>Mean coefficient</Head>
        <Head numeric unit={reading.unit}>
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
            <Cell numeric>{readNumber(reading, drag)}</Cell>
            <Cell numeric>{formatPercent(difference, 1)}</Cell>
            <Cell>{fitsSurface ? "yes" : "no"}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
