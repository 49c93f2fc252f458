import type { Metadata } from "next";
import { forbidden } from "next/navigation";

import { EmptyNote } from "@/app/_components/empty-note";
import { PageHeading } from "@/app/_components/page-heading";
import { Pager } from "@/app/_components/pager";
import { Sheet } from "@/app/_components/sheet";
import { TitleBlock } from "@/app/_components/title-block";
import { requireActor } from "@/app/_server/session";
import { mergeRepeats } from "@/lib/audit/merge-repeats";
import { houseHistory } from "@/lib/products/house-history";
import { isAllowed } from "@/policies/authorize";

import { HistoryFilter } from "@/app/(workspace)/products/[productCode]/history/_components/history-filter";
import {
  filterOf,
  historyAddress,
  HistoryQuery,
} from "@/app/(workspace)/products/[productCode]/history/_components/history-query";
import { HistoryTable } from "@/app/(workspace)/products/[productCode]/history/_components/history-table";
import { CheckHouseChain } from "./_components/check-house-chain";

export const metadata: Metadata = { title: "History of the installation" };

const PATH = "/administration/history";

export default async function HouseHistoryPage({ searchParams }: PageProps<"/administration/history">) {
  const actor = await requireActor();
  if (!isAllowed(actor, { on: "Installation", action: "read_house_history" })) forbidden();
  const query = HistoryQuery.parse(await searchParams);
  const history = await houseHistory(actor, filterOf(query), query.page);

  return (
    <>
      <PageHeading title="History of the installation" subtitle="Accounts, products and sign-ins, done or refused" />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Sheet", value: "Administration, history" },
              { label: "Entries", value: history.total },
              { label: "Chain ends at", value: history.head ? `entry ${history.head.sequence}` : "no entry yet" },
            ]}
          />
        }
      >
        <CheckHouseChain />
        <HistoryFilter path={PATH} query={query} persons={history.persons} acts={history.acts} total={history.total} />
        {history.rows.length > 0 ? (
          <HistoryTable rows={mergeRepeats(history.rows)} productCode="" />
        ) : (
          <EmptyNote title="No entry is like that.">Ask for less, or show all entries again.</EmptyNote>
        )}
        <Pager page={history.page} pages={history.pages} hrefOf={(page) => historyAddress(PATH, query, page)} />
      </Sheet>
    </>
  );
}
