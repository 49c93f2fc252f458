import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { formatHundredths, formatNewtons } from "@/lib/units/format-newtons";

import type { BudgetSheet } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { measuresOf } from "@/app/(workspace)/products/[productCode]/_sheet/measures";

/** The total and its limit in the measures of the trade; newtons are what is kept. */
export function MeasuresTable({ sheet: { budget, indexed, point } }: { sheet: BudgetSheet }) {
  const context = {
    kind: budget.product.kind,
    terms: indexed.terms,
    stream: point.stream,
    hoursPerYear: indexed.operatingPoints.get(point.operatingPoint)?.hoursPerYear ?? null,
  };
  const predicted = measuresOf(point.totals.predicted, context);
  const limit = measuresOf(point.limitHundredths / 100, context);
  if (predicted.length === 0) return null;

  return (
    <section aria-labelledby="measures" className="mt-7">
      <SectionHeading id="measures">In other measures</SectionHeading>
      <Table caption="The predicted total and the limit in other measures" narrow="stack">
        <TableHead>
          <Head>Measure</Head>
          <Head numeric>Predicted</Head>
          <Head numeric>Limit</Head>
        </TableHead>
        <tbody>
          <Row>
            <RowHead label="Measure">Drag</RowHead>
            <Cell numeric label="Predicted">
              {formatNewtons(point.totals.predicted)}
            </Cell>
            <Cell numeric label="Limit">
              {formatHundredths(point.limitHundredths)} N
            </Cell>
          </Row>
          {predicted.map(({ name, of, text, unit }, at) => (
            <Row key={name}>
              <RowHead label="Measure">
                {name}
                {of ? <span className="block text-xs text-ink-2">{of}</span> : null}
              </RowHead>
              <Cell numeric label="Predicted">
                {text} {unit}
              </Cell>
              <Cell numeric label="Limit">
                {limit[at]?.text ?? ""} {unit}
              </Cell>
            </Row>
          ))}
        </tbody>
      </Table>
    </section>
  );
}
