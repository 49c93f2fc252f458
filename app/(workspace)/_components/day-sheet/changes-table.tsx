import type { Route } from "next";
import Link from "next/link";

import { EmptyNote } from "@/app/_components/empty-note";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { UtcTime } from "@/app/_components/utc-time";
import type { DaySheetView } from "@/lib/proposals/workspace-views";
import { proposalPath } from "./waiting-table";

/** The issues that came since the reader last looked. */
export function ChangesTable({ changes }: { changes: DaySheetView["changedSince"] }) {
  if (changes.length === 0) return <EmptyNote title="No new issue since you last looked." />;

  return (
    <Table caption="What changed since you last looked" narrow="stack">
      <TableHead>
        <Head>Issue</Head>
        <Head>By</Head>
        <Head>When</Head>
      </TableHead>
      <tbody>
        {changes.map((change) => (
          <Row key={`${change.productCode} ${change.issue}`}>
            <RowHead label="Issue">
              <Link className="link" href={`/products/${change.productCode}/budget?issue=${change.issue}` as Route}>
                {change.productCode} issue {change.issue}
              </Link>
            </RowHead>
            <Cell label="By">
              <Link className="link" href={proposalPath(change)}>
                {change.label}
              </Link>{" "}
              <span className="text-ink-2">{change.title}</span>
            </Cell>
            <Cell label="When">
              <UtcTime at={change.at} />
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
