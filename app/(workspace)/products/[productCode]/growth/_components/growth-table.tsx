import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { SuggestedGrowth } from "@/lib/evaluation/budget/estimate-to-test";
import { MATURITY_GRADE_NAMES } from "@/lib/vocabulary/grades";

import { allowanceText, growthText } from "./growth-text";

/** The growth table in force beside what the tests would suggest. */
export function GrowthTable({ suggestions }: { suggestions: readonly SuggestedGrowth[] }) {
  return (
    <Table caption="Growth allowances in force and as tests suggest them" narrow="stack">
      <TableHead>
        <Head>Grade</Head>
        <Head numeric unit="of the basic estimate">
          In force
        </Head>
        <Head numeric>Pairs</Head>
        <Head numeric unit="of the estimate">
          Mean growth
        </Head>
        <Head numeric unit="of the estimate">
          Standard deviation
        </Head>
        <Head numeric unit="of the basic estimate">
          Suggested
        </Head>
      </TableHead>
      <tbody>
        {suggestions.map(({ grade, present, statistics, suggested }) => (
          <Row key={grade}>
            <RowHead label="Grade">{MATURITY_GRADE_NAMES[grade]}</RowHead>
            <Cell numeric label="In force">
              {allowanceText(present)}
            </Cell>
            <Cell numeric label="Pairs">
              {statistics?.pairs ?? 0}
            </Cell>
            <Cell numeric label="Mean growth">
              {statistics ? growthText(statistics.mean) : "–"}
            </Cell>
            <Cell numeric label="Standard deviation">
              {deviationText(statistics?.deviation ?? null)}
            </Cell>
            <Cell numeric label="Suggested">
              {suggested === null ? "too few pairs" : allowanceText(suggested)}
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

function deviationText(deviation: number | null): string {
  return deviation === null ? "–" : `${(deviation * 100).toFixed(1)} %`;
}
