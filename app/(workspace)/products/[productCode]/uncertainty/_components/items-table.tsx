import type { Route } from "next";
import Link from "next/link";

import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatPercent, formatSignificant } from "@/lib/units/format-number";

import { WorkingNumber } from "@/app/(workspace)/products/[productCode]/_components/workings-provider";
import type { BudgetSheet, ItemRow } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";

/** Each item's basic estimate with its standard uncertainty, in the order of the sheet. */
export function ItemsTable({ sheet: { rows, budget } }: { sheet: BudgetSheet }) {
  const items = rows.filter((row): row is ItemRow => row.kind === "item");

  return (
    <Table caption="Standard uncertainty of each item" narrow="stack">
      <TableHead>
        <Head>Item</Head>
        <Head numeric unit="N">
          Basic
        </Head>
        <Head numeric unit="N">
          Standard uncertainty
        </Head>
        <Head numeric unit="of basic">
          Standard uncertainty
        </Head>
      </TableHead>
      <tbody>
        {items.map((row) => (
          <ItemRowOf key={row.number} row={row} base={`/products/${budget.product.code}`} />
        ))}
      </tbody>
    </Table>
  );
}

function ItemRowOf({ row: { number, name, basic, result }, base }: { row: ItemRow; base: string }) {
  const u = result.answer?.standardUncertainty ?? 0;

  return (
    <Row>
      <RowHead label="Item">
        <Link href={`${base}/items/${encodeURIComponent(number)}` as Route} className="hover:underline">
          <span className="mr-1.5 text-ink-2">{number}</span>
          {name}
        </Link>
      </RowHead>
      <Cell numeric label="Basic, N">
        <WorkingNumber figure="basic" of="item" number={number} name={`Basic estimate of ${number} ${name}`}>
          {formatNewtonsNumber(basic)}
        </WorkingNumber>
      </Cell>
      <Cell numeric label="u, N">
        <WorkingNumber
          figure="standardUncertainty"
          of="item"
          number={number}
          name={`Standard uncertainty of ${number} ${name}`}
        >
          {formatSignificant(u)}
        </WorkingNumber>
      </Cell>
      <Cell numeric label="u, of basic">
        {basic === 0 ? "–" : formatPercent(u / Math.abs(basic), 1)}
      </Cell>
    </Row>
  );
}
