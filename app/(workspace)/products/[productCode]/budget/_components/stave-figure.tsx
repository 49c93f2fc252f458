import { FigureWithTable } from "@/app/_components/figure-with-table";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { standingSentence } from "@/lib/evaluation/budget/standing-sentence";
import { type Reading, readNumber, readText } from "@/lib/evaluation/measures/reading";

import { Stave } from "@/app/(workspace)/products/[productCode]/_pictures/stave";
import type { BudgetSheet, ItemRow } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { staveInput } from "@/app/(workspace)/products/[productCode]/_sheet/stave-input";

/** The stave of an operating point with the same numbers as a table behind it. */
export function StaveFigure({ sheet, reading }: { sheet: BudgetSheet; reading: Reading }) {
  const { point } = sheet;
  const { totals } = point;
  const print = (newtons: number) => readText(reading, newtons);
  const summary =
    `${standingSentence(point, print)} at ${point.operatingPoint}: basic ${print(totals.basic)}, growth ` +
    `${print(totals.growth)}, predicted ${print(totals.predicted)}, limit ` +
    `${print(point.limitHundredths / 100)}, reserve ${print(point.reserveHundredths / 100)}.`;

  return (
    <FigureWithTable
      summary={summary}
      picture={<Stave input={staveInput(sheet)} reading={reading} />}
      table={<StaveTable sheet={sheet} reading={reading} />}
    />
  );
}

function StaveTable({ sheet: { rows, point }, reading }: { sheet: BudgetSheet; reading: Reading }) {
  const items = rows.filter((row): row is ItemRow => row.kind === "item");

  return (
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
        {items.map(({ number, name, basic, growth, predicted }) => (
          <FigureRow key={number} name={`${number} ${name}`} figures={[basic, growth, predicted]} reading={reading} />
        ))}
        <FigureRow
          name="Total"
          figures={[point.totals.basic, point.totals.growth, point.totals.predicted]}
          reading={reading}
          band
        />
      </tbody>
    </Table>
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
