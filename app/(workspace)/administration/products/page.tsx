import type { Metadata, Route } from "next";
import Link from "next/link";

import { EmptyNote } from "@/app/_components/empty-note";
import { PageHeading } from "@/app/_components/page-heading";
import { SectionHeading } from "@/app/_components/section-heading";
import { Sheet } from "@/app/_components/sheet";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { TitleBlock } from "@/app/_components/title-block";
import { requireAdministrator } from "@/app/_server/administration-access";
import type { RegisterEntry } from "@/lib/budget/views";
import { registerFor } from "@/lib/products/queries";
import { PRODUCT_KIND_NAMES } from "@/lib/vocabulary/lines";

import { NewProductForm } from "./_components/new-product-form";

export const metadata: Metadata = { title: "Products of the installation" };

export default async function AdministrationProductsPage() {
  const entries = await registerFor(await requireAdministrator());
  // Intl does not list UTC, which is the first choice here.
  const timeZones = ["UTC", ...Intl.supportedValuesOf("timeZone").filter((zone) => zone !== "UTC")];

  return (
    <>
      <PageHeading title="Products of the installation" />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Sheet", value: "Administration, products" },
              { label: "Products", value: entries.length },
            ]}
          />
        }
      >
        {entries.length > 0 ? <ProductsTable entries={entries} /> : <EmptyNote title="No product yet." />}
        <SectionHeading>Make a product</SectionHeading>
        <NewProductForm timeZones={timeZones} />
      </Sheet>
    </>
  );
}

function ProductsTable({ entries }: { entries: readonly RegisterEntry[] }) {
  return (
    <Table caption="Products" narrow="stack">
      <TableHead>
        <Head>Product</Head>
        <Head>Kind</Head>
        <Head>Time zone</Head>
        <Head numeric>Issue</Head>
        <Head>Roles</Head>
      </TableHead>
      <tbody>
        {entries.map(({ product }) => (
          <Row key={product.code}>
            <RowHead label="Product">
              <Link className="link" href={`/products/${product.code}` as Route}>
                {product.code}
              </Link>{" "}
              {product.name}
            </RowHead>
            <Cell label="Kind">{PRODUCT_KIND_NAMES[product.kind]}</Cell>
            <Cell label="Time zone">{product.timeZone.replaceAll("_", " ")}</Cell>
            <Cell numeric label="Issue">
              {product.newestIssue ?? "not established"}
            </Cell>
            <Cell label="Roles">
              <Link className="link" href={`/administration/roles?product=${product.code}`}>
                Give or end roles
              </Link>
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
