import type { Route } from "next";
import Link from "next/link";

import { EmptyNote } from "@/app/_components/empty-note";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { BudgetAt } from "@/lib/budget/views";
import { formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatRoughness } from "@/lib/units/format-quantity";
import type { UnitSystem } from "@/lib/units/us-customary";

import { InUsUnits } from "@/app/(workspace)/products/[productCode]/_components/in-us-units";

interface FinishItemsProps {
  budget: BudgetAt;
  items: readonly string[];
  units: UnitSystem;
}

/** Every item of a finish at every operating point: the roughness is judged anew at each. */
export function FinishItems({ budget, items, units }: FinishItemsProps) {
  if (items.length === 0) {
    return <EmptyNote title="No item has this finish.">A change of it moves nothing.</EmptyNote>;
  }
  const rows = budget.results.points.flatMap(({ operatingPoint, items: results }) =>
    results.filter(({ item }) => items.includes(item)).map((result) => ({ operatingPoint, result })),
  );
  const names = new Map(
    budget.state.lines.flatMap((line) => (line.kind === "item" ? [[line.number, line.body.name]] : [])),
  );

  return (
    <Table caption="Items that have this finish" narrow="stack">
      <TableHead>
        <Head className="w-[34%]">Item</Head>
        <Head>Operating point</Head>
        <Head>Admissible roughness</Head>
        <Head>The surface is</Head>
        <Head numeric unit="N">
          Predicted
        </Head>
      </TableHead>
      <tbody>
        {rows.map(({ operatingPoint, result: { item, answer, predicted } }) => (
          <Row key={`${item} ${operatingPoint}`}>
            <RowHead label="Item">
              <Link className="link" href={`/products/${budget.product.code}/items/${item}` as Route}>
                {item} {names.get(item)}
              </Link>
            </RowHead>
            <Cell label="Operating point">{operatingPoint}</Cell>
            <Cell label="Admissible">
              {answer?.admissibleRoughness === undefined ? "–" : formatRoughness(answer.admissibleRoughness, units)}
            </Cell>
            <Cell label="The surface is">{answer?.roughnessVerdict ?? "–"}</Cell>
            <Cell numeric label="Predicted, N">
              {answer === null ? "refused" : formatNewtonsNumber(predicted)}
              {answer === null ? null : <InUsUnits value={predicted} dimension="force" units={units} />}
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
