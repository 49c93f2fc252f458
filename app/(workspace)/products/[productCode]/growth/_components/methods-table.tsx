import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { type EstimateAndTest, growthStatistics } from "@/lib/evaluation/budget/estimate-to-test";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";

import { growthText } from "./growth-text";

/** How the estimates of each method fared. */
export function MethodsTable({ pairs }: { pairs: readonly EstimateAndTest[] }) {
  const methods = [...new Set(pairs.map(({ method }) => method))];

  return (
    <Table caption="Growth by method of the estimate" narrow="stack">
      <TableHead>
        <Head>Method</Head>
        <Head numeric>Pairs</Head>
        <Head numeric unit="of the estimate">
          Mean growth
        </Head>
        <Head numeric unit="of the estimate">
          Least to greatest
        </Head>
      </TableHead>
      <tbody>
        {methods.map((method) => {
          const statistics = growthStatistics(pairs.filter((pair) => pair.method === method));
          if (!statistics) return null;
          return (
            <Row key={method}>
              <RowHead label="Method">{ITEM_METHODS[method].label}</RowHead>
              <Cell numeric label="Pairs">
                {statistics.pairs}
              </Cell>
              <Cell numeric label="Mean growth, of the estimate">
                {growthText(statistics.mean)}
              </Cell>
              <Cell numeric label="Least to greatest">
                {growthText(statistics.least)} to {growthText(statistics.greatest)}
              </Cell>
            </Row>
          );
        })}
      </tbody>
    </Table>
  );
}
