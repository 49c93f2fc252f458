import { SymbolText } from "@/app/_components/symbol-text";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { UnitSystem } from "@/lib/units/us-customary";

import { ANSWER_FIELDS } from "@/app/(workspace)/products/[productCode]/_sheet/answer-rows";
import type { PointRow } from "./results-table";

/** Everything the method gives, side by side at every operating point. */
export function AnswerTable({ points, units }: { points: readonly PointRow[]; units: UnitSystem }) {
  const rows = ANSWER_FIELDS.map(({ name, symbol, text }) => ({
    name,
    symbol,
    texts: points.map(({ row }) => (row.result.answer ? text(row.result.answer, units) : null)),
  })).filter(({ texts }) => texts.some((text) => text !== null));
  if (rows.length === 0) return null;

  return (
    <Table caption="What the method gives at every operating point">
      <TableHead>
        <Head>Quantity</Head>
        {points.map(({ sheet: { point } }) => (
          <Head key={point.operatingPoint} numeric>
            {point.operatingPoint}
          </Head>
        ))}
      </TableHead>
      <tbody>
        {rows.map(({ name, symbol, texts }) => (
          <Row key={name}>
            <RowHead>
              {name} <SymbolText symbol={symbol} />
            </RowHead>
            {texts.map((text, at) => (
              <Cell key={at} numeric>
                {text ?? "–"}
              </Cell>
            ))}
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
