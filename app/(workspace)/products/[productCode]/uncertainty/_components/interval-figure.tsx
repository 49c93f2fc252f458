import { FigureWithTable } from "@/app/_components/figure-with-table";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { RunView } from "@/lib/budget/monte-carlo/runs-of";
import type { PointResult } from "@/lib/evaluation/budget/results";
import type { PointUncertainty } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import { formatHundredths, formatNewtons, formatNewtonsNumber } from "@/lib/units/format-newtons";

import { IntervalPicture } from "@/app/(workspace)/products/[productCode]/_pictures/interval-picture";
import { chanceText } from "@/app/(workspace)/products/[productCode]/_uncertainty/chance-text";

interface IntervalFigureProps {
  point: PointResult;
  frozen: PointUncertainty;
  newestRun: RunView | null;
}

/** Where the total may lie against the limit, with the same numbers as a table behind it. */
export function IntervalFigure({ point, frozen, newestRun }: IntervalFigureProps) {
  const { basic, predicted, predictedExceedsLimit } = frozen;
  const limit = point.limitHundredths / 100;
  const summary =
    `95 % interval of the basic total at ${point.operatingPoint}: ${formatNewtonsNumber(basic.low95)} to ` +
    `${formatNewtons(basic.high95)}. Limit ${formatNewtons(limit)}; the total with growth exceeds it with a ` +
    `probability of ${chanceText(predictedExceedsLimit)}.`;

  return (
    <FigureWithTable
      summary={summary}
      picture={<IntervalPicture input={{ basic, predicted, limit, drawn: newestRun?.result.basic ?? null }} />}
      caption={
        <span>
          Newtons. Filled: ΣB; line: ΣB + ΣG; red: what of it lies beyond the limit. Dimensions: 95 % of ΣB
          {newestRun ? ", to first order and of the newest run" : ", to first order"}.
        </span>
      }
      table={<IntervalTable point={point} frozen={frozen} />}
    />
  );
}

function IntervalTable({ point, frozen: { basic, predicted } }: Pick<IntervalFigureProps, "point" | "frozen">) {
  const rows = [
    ["ΣB", basic.value],
    ["Standard uncertainty of ΣB", basic.standardUncertainty],
    ["Lower end of its 95 % interval", basic.low95],
    ["Upper end", basic.high95],
    ["ΣB + ΣG", predicted.value],
    ["Standard uncertainty of ΣB + ΣG", predicted.standardUncertainty],
  ] as const;

  return (
    <Table caption="The numbers of the picture" narrow="stack">
      <TableHead>
        <Head>Quantity</Head>
        <Head numeric unit="N">
          Value
        </Head>
      </TableHead>
      <tbody>
        {rows.map(([name, newtons]) => (
          <Row key={name}>
            <RowHead label="Quantity">{name}</RowHead>
            <Cell numeric label="N">
              {formatNewtonsNumber(newtons)}
            </Cell>
          </Row>
        ))}
        <Row>
          <RowHead label="Quantity">Limit</RowHead>
          <Cell numeric label="N">
            {formatHundredths(point.limitHundredths)}
          </Cell>
        </Row>
      </tbody>
    </Table>
  );
}
