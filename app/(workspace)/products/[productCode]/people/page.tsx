import type { Metadata } from "next";

import { requireActor } from "@/app/_server/session";
import { EmptyNote } from "@/app/_components/empty-note";
import { Notice } from "@/app/_components/notice";
import { PageHeading } from "@/app/_components/page-heading";
import { Sheet } from "@/app/_components/sheet";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { TitleBlock } from "@/app/_components/title-block";
import { UtcTime } from "@/app/_components/utc-time";
import { deputiesOf, establishWarnings, membershipsOf, type MembershipView } from "@/lib/products/queries";
import { ROLE_NAMES } from "@/lib/vocabulary/roles";
import { abilityFor, covers } from "@/policies/ability";

import { pageProduct, readForPage } from "../_server/read-page";
import { DeputiesSection } from "./_components/deputies-section";

type Props = PageProps<"/products/[productCode]/people">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `People of ${(await params).productCode}` };
}

export default async function PeoplePage({ params }: Props) {
  const { productCode } = await params;
  const [actor, product] = await Promise.all([requireActor(), pageProduct(productCode)]);
  const [memberships, warnings, deputies] = await readForPage(() =>
    Promise.all([
      membershipsOf(actor, productCode),
      establishWarnings(actor, productCode, new Date().toISOString()),
      deputiesOf(actor, productCode),
    ]),
  );
  const mayName = covers(abilityFor(actor), { on: "Product", action: "name_deputy", productId: product.id });

  return (
    <>
      <PageHeading
        title="People"
        subtitle={`${product.code} · ${product.name} · who holds and held which role, and who stands in`}
      />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Product", value: `${product.code} ${product.name}` },
              { label: "Sheet", value: "People" },
            ]}
          />
        }
      >
        {warnings.map((warning) => (
          <div key={warning} className="mb-3">
            <Notice kind="caution">{warning}</Notice>
          </div>
        ))}
        {memberships.length === 0 ? (
          <EmptyNote title="Nobody holds a role here yet.">An administrator of the installation gives roles.</EmptyNote>
        ) : (
          <PeopleTable memberships={memberships} />
        )}
        <DeputiesSection
          product={product}
          deputies={deputies}
          memberships={memberships}
          readerId={actor.userId}
          mayName={mayName}
        />
      </Sheet>
    </>
  );
}

function PeopleTable({ memberships }: { memberships: readonly MembershipView[] }) {
  return (
    <Table caption="Roles, those in force first" narrow="stack">
      <TableHead>
        <Head>Name</Head>
        <Head>Role</Head>
        <Head>From</Head>
        <Head>Until</Head>
      </TableHead>
      <tbody>
        {memberships.map(({ membershipId, person, role, from, until }) => (
          <Row key={membershipId}>
            <RowHead label="Name">{person.name}</RowHead>
            <Cell label="Role">{ROLE_NAMES[role]}</Cell>
            <Cell label="From">
              <UtcTime at={from} />
            </Cell>
            <Cell label="Until">{until === null ? "in force" : <UtcTime at={until} />}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
