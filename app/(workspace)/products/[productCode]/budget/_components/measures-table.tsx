import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { SheetPoint } from "@/lib/budget/sheet-data";
import { measuresOffered } from "@/lib/evaluation/measures/measure-basis";
import { readingOf, readText } from "@/lib/evaluation/measures/reading";
import type { UnitSystem } from "@/lib/units/us-customary";
import { MEASURE_NAMES } from "@/lib/vocabulary/measures";

/** The total and its limit in every measure that the product has; newtons are what is kept. */
export function MeasuresTable({ point, units }: { point: SheetPoint; units: UnitSystem }) {
  const { basis } = point;
  const readings = measuresOffered(basis).flatMap((measure) => [
    ...(measure === "newtons" && units === "us" ? [readingOf(measure, basis, "si")] : []),
    readingOf(measure, basis, units),
  ]);

  return (
    <section aria-labelledby="measures" className="mt-7">
      <SectionHeading id="measures">In every measure</SectionHeading>
      <Table caption="The predicted total and the limit in every measure" narrow="stack">
        <TableHead>
          <Head>Measure</Head>
          <Head numeric>Predicted</Head>
          <Head numeric>Limit</Head>
        </TableHead>
        <tbody>
          {readings.map((reading) =>
            reading === null ? null : (
              <Row key={`${reading.measure} ${reading.unit}`}>
                <RowHead label="Measure">
                  {MEASURE_NAMES[reading.measure]}
                  {reading.basis ? <span className="block text-xs text-ink-2">{reading.basis}</span> : null}
                </RowHead>
                <Cell numeric label="Predicted">
                  {readText(reading, point.totals.predicted)}
                </Cell>
                <Cell numeric label="Limit">
                  {readText(reading, point.limitHundredths / 100)}
                </Cell>
              </Row>
            ),
          )}
        </tbody>
      </Table>
    </section>
  );
}
