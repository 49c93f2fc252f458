import Link from "next/link";

import { EmptyNote } from "@/app/_components/empty-note";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { UtcTime } from "@/app/_components/utc-time";
import type { DaySheetView } from "@/lib/proposals/workspace-views";
import { CAPACITY_NAMES } from "./capacity-names";
import { NeededBy, proposalPath } from "./waiting-table";

/** What the reader proposed and others have still to do. */
export function AwaitedTable({ entries, today }: { entries: DaySheetView["iWaitFor"]; today: string }) {
  if (entries.length === 0) return <EmptyNote title="You wait for nobody." />;

  return (
    <Table caption="What you wait for" narrow="stack">
      <TableHead>
        <Head>Proposal</Head>
        <Head>Waits for</Head>
        <Head>Since</Head>
        <Head>Needed by</Head>
      </TableHead>
      <tbody>
        {entries.map((entry) => (
          <Row key={entry.proposalId}>
            <RowHead label="Proposal">
              <Link className="link" href={proposalPath(entry)}>
                {entry.label}
              </Link>{" "}
              <span className="text-ink-2">{entry.title}</span>
            </RowHead>
            <Cell label="Waits for">
              {entry.waitingFor.length === 0 ? entry.what : null}
              {entry.waitingFor.map(({ capacity, names }) => (
                <span key={capacity} className="block">
                  {CAPACITY_NAMES[capacity]}: {names.length > 0 ? names.join(" or ") : "nobody holds this role"}
                </span>
              ))}
            </Cell>
            <Cell label="Since">
              <UtcTime at={entry.since} />
            </Cell>
            <Cell label="Needed by">
              <NeededBy day={entry.neededBy} today={today} />
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
