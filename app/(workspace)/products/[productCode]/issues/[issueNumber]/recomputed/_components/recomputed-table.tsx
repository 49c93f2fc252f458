import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { RecomputedItem, RecomputedPoint } from "@/lib/budget/recomputed-today";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import { formatNewtonsChangeNumber, formatNewtonsNumber } from "@/lib/units/format-newtons";

/** Predicted values of one operating point: as signed, as the same versions give them today, and by the newest. */
export function RecomputedTable({ point }: { point: RecomputedPoint }) {
  const { items, total } = point;

  return (
    <Table caption={`Predicted values at ${point.operatingPoint}, kept and recomputed`} narrow="stack">
      <TableHead>
        <Head>Item</Head>
        <Head>Method, version</Head>
        <Head numeric unit="N">
          As signed
        </Head>
        <Head numeric unit="N">
          Today, same version
        </Head>
        <Head numeric unit="N">
          Difference
        </Head>
        <Head>Newest version</Head>
        <Head numeric unit="N">
          By the newest
        </Head>
      </TableHead>
      <tbody>
        {items.map((item) => (
          <ItemRow key={item.item} {...item} />
        ))}
        <Row band>
          <RowHead label="Item">Sum</RowHead>
          <Cell className="max-sm:hidden!" />
          <Cell numeric label="As signed, N">
            {formatNewtonsNumber(total.frozen)}
          </Cell>
          <Cell numeric label="Today, N">
            {formatNewtonsNumber(total.today)}
          </Cell>
          <Cell numeric label="Difference, N">
            {formatNewtonsChangeNumber(total.today - total.frozen)}
          </Cell>
          <Cell className="max-sm:hidden!" />
          <Cell numeric label="By the newest, N">
            {formatNewtonsNumber(total.newest)}
          </Cell>
        </Row>
      </tbody>
    </Table>
  );
}

function ItemRow({ item, name, method, version, newestVersion, frozen, today, newest }: RecomputedItem) {
  return (
    <Row>
      <RowHead label="Item">
        {item} {name}
      </RowHead>
      <Cell label="Method, version">
        {ITEM_METHODS[method].label}, {version}
      </Cell>
      <Cell numeric label="As signed, N">
        {formatNewtonsNumber(frozen)}
      </Cell>
      <Cell numeric label="Today, N">
        {newtonsOrRefused(today)}
      </Cell>
      <Cell numeric label="Difference, N">
        {today === null ? "–" : formatNewtonsChangeNumber(today - frozen)}
      </Cell>
      <Cell label="Newest version">{newestVersion === version ? "the same" : newestVersion}</Cell>
      <Cell numeric label="By the newest, N">
        {newtonsOrRefused(newest)}
      </Cell>
    </Row>
  );
}

function newtonsOrRefused(newtons: number | null): string {
  return newtons === null ? "refused" : formatNewtonsNumber(newtons);
}
