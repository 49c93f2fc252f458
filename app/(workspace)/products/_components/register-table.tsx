import type { Route } from "next";
import Link from "next/link";

import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { RegisterEntry } from "@/lib/budget/views";
import { formatNewtonsNumber } from "@/lib/units/format-newtons";
import { PRODUCT_KIND_NAMES } from "@/lib/vocabulary/lines";
import { ROLE_NAMES } from "@/lib/vocabulary/roles";
import { STANDING_NAMES } from "@/lib/vocabulary/standing";

/** All products that the reader may see, each with where it stands at its worst operating point. */
export function RegisterTable({ entries }: { entries: readonly RegisterEntry[] }) {
  return (
    <Table caption="Products" narrow="stack">
      <TableHead>
        <Head>Product</Head>
        <Head>Kind</Head>
        <Head numeric>Issue</Head>
        <Head>Worst at</Head>
        <Head numeric unit="N">
          Predicted
        </Head>
        <Head numeric unit="N">
          Limit
        </Head>
        <Head numeric unit="N">
          Margin
        </Head>
        <Head>Standing</Head>
        <Head numeric>Open proposals</Head>
      </TableHead>
      <tbody>
        {entries.map((entry) => (
          <RegisterRow key={entry.product.code} entry={entry} />
        ))}
      </tbody>
    </Table>
  );
}

function RegisterRow({ entry: { product, roles, worst, openProposals } }: { entry: RegisterEntry }) {
  const over = worst?.standing === "over";

  return (
    <Row>
      <RowHead label="Product">
        <Link className="link font-medium" href={`/products/${product.code}` as Route}>
          {product.code}
        </Link>{" "}
        {product.name}
        <span className="block text-xs text-ink-2">
          {roles.length > 0 ? roles.map(roleName).join(", ") : "no role of yours"}
        </span>
      </RowHead>
      <Cell label="Kind">{PRODUCT_KIND_NAMES[product.kind]}</Cell>
      <Cell numeric label="Issue">
        {product.newestIssue ?? "not established"}
      </Cell>
      <Cell label="Worst at">{worst ? `${worst.operatingPoint} ${worst.name}` : "–"}</Cell>
      <Cell numeric label="Predicted">
        {worst ? formatNewtonsNumber(worst.predicted) : "–"}
      </Cell>
      <Cell numeric label="Limit">
        {worst ? formatNewtonsNumber(worst.limit) : "–"}
      </Cell>
      <Cell numeric label="Margin" className={over ? "font-semibold text-signal" : ""}>
        {worst ? formatNewtonsNumber(worst.margin) : "–"}
      </Cell>
      <Cell label="Standing" className={over ? "font-semibold text-signal" : ""}>
        {worst ? STANDING_NAMES[worst.standing] : "–"}
      </Cell>
      <Cell numeric label="Open proposals">
        {openProposals}
      </Cell>
    </Row>
  );
}

function roleName(role: string): string {
  return Object.entries(ROLE_NAMES).find(([key]) => key === role)?.[1] ?? role;
}
