import type { Route } from "next";
import Link from "next/link";

import { EmptyNote } from "@/app/_components/empty-note";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { UtcTime } from "@/app/_components/utc-time";
import { dayText } from "@/app/_components/utc-text";
import { marginShare } from "@/lib/proposals/review/margin-share";
import type { WaitingOrder } from "@/lib/proposals/day-sheet/waiting-order";
import type { DaySheetEntry } from "@/lib/proposals/workspace-views";
import { formatNewtons } from "@/lib/units/format-newtons";

interface WaitingTableProps {
  entries: readonly DaySheetEntry[];
  /** Day of today, as 2026-05-31: what was needed by an earlier day says so. */
  today: string;
  order: WaitingOrder;
}

/** What the reader is asked to do, the most pressing first. */
export function WaitingTable({ entries, today, order }: WaitingTableProps) {
  if (entries.length === 0) {
    return (
      <EmptyNote title="Nothing waits for you.">
        Proposals to sign, requests to answer and drafts to carry forward are listed here as they come.
      </EmptyNote>
    );
  }

  return (
    <Table caption="What waits for you" narrow="stack">
      <TableHead>
        <Head>What to do</Head>
        <Head>Proposal</Head>
        <Head>Since</Head>
        <Head sortHref="/" sorted={order === "needed" ? "ascending" : undefined}>
          Needed by
        </Head>
        <Head sortHref="/?by=margin" sorted={order === "margin" ? "descending" : undefined}>
          Takes of the margin
        </Head>
      </TableHead>
      <tbody>
        {entries.map((entry) => (
          <Row key={`${entry.proposalId} ${entry.what}`}>
            <RowHead label="What to do">
              <Link className="link font-medium" href={proposalPath(entry)}>
                {entry.what}
              </Link>
            </RowHead>
            <Cell label="Proposal">
              {entry.label} <span className="text-ink-2">{entry.title}</span>
            </Cell>
            <Cell label="Since">
              <UtcTime at={entry.since} />
            </Cell>
            <Cell label="Needed by">
              <NeededBy day={entry.neededBy} today={today} />
            </Cell>
            <Cell label="Margin">
              <MarginTaken margin={entry.margin} />
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

export function proposalPath({ productCode, key }: { productCode: string; key: string }): Route {
  return `/products/${productCode}/proposals/${key}` as Route;
}

/** What a change takes of the margin to the limit where the budget stands worst with it. */
function MarginTaken({ margin }: { margin: DaySheetEntry["margin"] }) {
  if (margin === null) return <span className="text-ink-2">–</span>;
  const share = marginShare(margin);
  if (share === 0) return <span className="text-ink-2">nothing</span>;
  if (!Number.isFinite(share)) return <strong className="font-semibold">none is left</strong>;

  return (
    <span className="whitespace-nowrap">
      {formatPercent(share)} of {formatNewtons(margin.marginWas)}
    </span>
  );
}

function formatPercent(share: number): string {
  return share < 0.01 ? "under 1\u2009%" : `${Math.round(share * 100)}\u2009%`;
}

export function NeededBy({ day, today }: { day: string | null; today: string }) {
  if (!day) return <span className="text-ink-2">no date</span>;
  if (day < today) return <strong className="font-semibold">{dayText(day)}, passed</strong>;

  return <span className="whitespace-nowrap">{dayText(day)}</span>;
}
