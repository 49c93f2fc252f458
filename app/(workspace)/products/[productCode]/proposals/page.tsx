import type { Metadata } from "next";
import { notFound } from "next/navigation";

import { requireActor } from "@/app/_server/session";
import { ButtonLink } from "@/app/_components/button";
import { EmptyNote } from "@/app/_components/empty-note";
import { PageHeading } from "@/app/_components/page-heading";
import { SectionHeading } from "@/app/_components/section-heading";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { proposalList } from "@/lib/proposals/queries";
import type { ProposalListRow } from "@/lib/proposals/workspace-views";
import { END_STATES } from "@/lib/vocabulary/proposals";

import { readForPage } from "../_server/read-page";
import { ProposalsTable } from "./_components/proposals-table";
import { StartDraft } from "./_components/start-draft";

type Props = PageProps<"/products/[productCode]/proposals">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Proposals of ${(await params).productCode}` };
}

export default async function ProposalsPage({ params }: Props) {
  const { productCode } = await params;
  const actor = await requireActor();
  const list = await readForPage(() => proposalList(actor, productCode));
  if (!list) notFound();
  const { product, rows, mayStart, newestIssue } = list;

  return (
    <>
      <PageHeading
        title="Proposals"
        subtitle={`${product.code} · ${product.name} · issue ${newestIssue}`}
        actions={
          <>
            {rows.some(({ state }) => state === "draft" || state === "proposed") ? (
              <ButtonLink href={`/products/${product.code}/what-if`}>What if…</ButtonLink>
            ) : null}
            {mayStart ? <StartDraft productCode={product.code} /> : null}
          </>
        }
      />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Product", value: `${product.code} ${product.name}` },
              { label: "Issue", value: newestIssue },
              { label: "Sheet", value: "Proposals" },
            ]}
          />
        }
      >
        {rows.length === 0 ? (
          <EmptyNote title="No proposals yet.">
            A proposal is how any number of this budget changes: start a draft, revise its lines, propose it.
          </EmptyNote>
        ) : (
          <Groups productCode={product.code} rows={rows} />
        )}
      </Sheet>
    </>
  );
}

function Groups({ productCode, rows }: { productCode: string; rows: readonly ProposalListRow[] }) {
  const groups = [
    { heading: "Drafts", rows: rows.filter(({ state }) => state === "draft") },
    { heading: "Open", rows: rows.filter(({ state }) => state === "proposed" || state === "returned") },
    { heading: "Decided", rows: rows.filter(({ state }) => END_STATES.includes(state)) },
  ];

  return groups
    .filter((group) => group.rows.length > 0)
    .map((group) => (
      <section key={group.heading} className="mt-7 first:mt-0">
        <SectionHeading aside={group.rows.length}>{group.heading}</SectionHeading>
        <ProposalsTable caption={`${group.heading} proposals`} productCode={productCode} rows={group.rows} />
      </section>
    ));
}
