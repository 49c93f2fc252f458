import { FigureWithTable } from "@/app/_components/figure-with-table";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { SheetDataRow } from "@/lib/budget/sheet-data";
import type { PointTotals } from "@/lib/evaluation/budget/results";
import { standingSentence } from "@/lib/evaluation/budget/standing-sentence";
import { type Reading, readNumber, readText } from "@/lib/evaluation/measures/reading";

import { Stave } from "@/app/(workspace)/products/[productCode]/_pictures/stave";
import { staveInput } from "@/app/(workspace)/products/[productCode]/_sheet/stave-input";

interface StaveFigureProps {
  rows: readonly SheetDataRow[];
  point: PointTotals;
  reading: Reading;
}

/** The stave of an operating point with the same numbers as a table behind it. */
export function StaveFigure({ rows, point, reading }: StaveFigureProps) {
  const { totals } = point;
  const print = (newtons: number) => readText(reading, newtons);
  const summary =
    `${standingSentence(point, print)} at ${point.operatingPoint}: basic ${print(totals.basic)}, growth ` +
    `${print(totals.growth)}, predicted ${print(totals.predicted)}, limit ` +
    `${print(point.limitHundredths / 100)}, reserve ${print(point.reserveHundredths / 100)}.`;

  return (
    <FigureWithTable
      summary={summary}
      picture={<Stave input={staveInput(rows, point)} reading={reading} />}
      table={<StaveTable rows={rows} point={point} reading={reading} />}
    />
  );
}

/** So many parts at most: the items of a larger budget stand in the table of items, the page below the picture. */
const MOST_PARTS = 25;

function StaveTable({ rows, point, reading }: StaveFigureProps) {
  const items = rows.filter(({ kind }) => kind === "item");
  const parts = items.length <= MOST_PARTS ? items : rows.filter(({ depth }) => depth === 0).slice(0, MOST_PARTS);
  const isWhole = items.length <= MOST_PARTS;

  return (
    <>
      {isWhole ? null : (
        <p className="mb-2 text-sm text-ink-2">
          Of {items.length} items the groups of the first level; every item stands in the table of items below.
        </p>
      )}
      <Table caption="The numbers of the picture">
        <TableHead>
          <Head>Part</Head>
          {["Basic", "Growth", "Predicted"].map((label) => (
            <Head key={label} numeric unit={reading.unit}>
              {label}
            </Head>
          ))}
        </TableHead>
        <tbody>
          {parts.map(({ kind, number, name, basic, growth, predicted }) => (
            <FigureRow
              key={`${kind} ${number}`}
              name={`${number} ${name}`}
              figures={[basic, growth, predicted]}
              reading={reading}
            />
          ))}
          <FigureRow
            name="Total"
            figures={[point.totals.basic, point.totals.growth, point.totals.predicted]}
            reading={reading}
            band
          />
        </tbody>
      </Table>
    </>
  );
}

interface FigureRowProps {
  name: string;
  figures: number[];
  reading: Reading;
  band?: boolean;
}

function FigureRow({ name, figures, reading, band }: FigureRowProps) {
  return (
    <Row band={band}>
      <RowHead>{name}</RowHead>
      {figures.map((figure, at) => (
        <Cell key={at} numeric>
          {readNumber(reading, figure)}
        </Cell>
      ))}
    </Row>
  );
}
