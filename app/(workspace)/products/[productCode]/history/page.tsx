import type { Metadata } from "next";

import { requireActor } from "@/app/_server/session";
import { EmptyNote } from "@/app/_components/empty-note";
import { PageHeading } from "@/app/_components/page-heading";
import { Pager } from "@/app/_components/pager";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { mergeRepeats } from "@/lib/audit/merge-repeats";
import { productHistory } from "@/lib/budget/product-history";

import { pageProduct, readForPage } from "../_server/read-page";
import { CheckChain } from "./_components/check-chain";
import { HistoryFilter } from "./_components/history-filter";
import { filterOf, historyAddress, HistoryQuery } from "./_components/history-query";
import { HistoryTable } from "./_components/history-table";

type Props = PageProps<"/products/[productCode]/history">;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `History of ${(await params).productCode}` };
}

export default async function HistoryPage({ params, searchParams }: Props) {
  const { productCode } = await params;
  const query = HistoryQuery.parse(await searchParams);
  const [actor, product] = await Promise.all([requireActor(), pageProduct(productCode)]);
  const history = await readForPage(() => productHistory(actor, productCode, filterOf(query), query.page));
  const path = `/products/${product.code}/history`;
  const head = history.head ? `entry ${history.head.sequence}` : "no entry yet";

  return (
    <>
      <PageHeading
        title="History"
        subtitle={`${product.code} · ${product.name} · every act, done or refused`}
        actions={
          <a className="link self-center text-sm" href={`/api/products/${product.code}/history`} download>
            Take it as JSON lines
          </a>
        }
      />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Product", value: `${product.code} ${product.name}` },
              { label: "Sheet", value: "History" },
              { label: "Chain ends at", value: head },
            ]}
          />
        }
      >
        <CheckChain productCode={product.code} />
        <HistoryFilter path={path} query={query} persons={history.persons} acts={history.acts} total={history.total} />
        {history.rows.length === 0 ? (
          <EmptyNote title="No entry is like that.">Ask for less, or show all entries again.</EmptyNote>
        ) : (
          <HistoryTable rows={mergeRepeats(history.rows)} productCode={product.code} />
        )}
        <Pager page={history.page} pages={history.pages} hrefOf={(page) => historyAddress(path, query, page)} />
      </Sheet>
    </>
  );
}
