import { FigureWithTable } from "@/app/_components/figure-with-table";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { standingSentence } from "@/lib/evaluation/budget/standing-sentence";
import { formatHundredths, formatNewtons, formatNewtonsNumber } from "@/lib/units/format-newtons";

import { Stave } from "@/app/(workspace)/products/[productCode]/_pictures/stave";
import type { BudgetSheet, ItemRow } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { staveInput } from "@/app/(workspace)/products/[productCode]/_sheet/stave-input";

/** The stave of an operating point with the same numbers as a table behind it. */
export function StaveFigure({ sheet }: { sheet: BudgetSheet }) {
  const { point } = sheet;
  const { totals } = point;
  const summary =
    `${standingSentence(point)} at ${point.operatingPoint}: basic ${formatNewtons(totals.basic)}, growth ` +
    `${formatNewtons(totals.growth)}, predicted ${formatNewtons(totals.predicted)}, limit ` +
    `${formatHundredths(point.limitHundredths)} N, reserve ${formatHundredths(point.reserveHundredths)} N.`;

  return (
    <FigureWithTable
      summary={summary}
      picture={<Stave input={staveInput(sheet)} />}
      table={<StaveTable sheet={sheet} />}
    />
  );
}

function StaveTable({ sheet: { rows, point } }: { sheet: BudgetSheet }) {
  const items = rows.filter((row): row is ItemRow => row.kind === "item");

  return (
    <Table caption="The numbers of the picture">
      <TableHead>
        <Head>Part</Head>
        <Head numeric unit="N">
          Basic
        </Head>
        <Head numeric unit="N">
          Growth
        </Head>
        <Head numeric unit="N">
          Predicted
        </Head>
      </TableHead>
      <tbody>
        {items.map(({ number, name, basic, growth, predicted }) => (
          <FigureRow key={number} name={`${number} ${name}`} figures={[basic, growth, predicted]} />
        ))}
        <FigureRow name="Total" figures={[point.totals.basic, point.totals.growth, point.totals.predicted]} band />
      </tbody>
    </Table>
  );
}

function FigureRow({ name, figures, band }: { name: string; figures: number[]; band?: boolean }) {
  return (
    <Row band={band}>
      <RowHead>{name}</RowHead>
      {figures.map((figure, at) => (
        <Cell key={at} numeric>
          {formatNewtonsNumber(figure)}
        </Cell>
      ))}
    </Row>
  );
}
