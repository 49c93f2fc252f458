import type { Route } from "next";
import Link from "next/link";

import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { UtcTime } from "@/app/_components/utc-time";
import type { ShownRow } from "@/lib/audit/merge-repeats";
import { ACT_NAMES } from "@/lib/vocabulary/acts";
import { ROLE_NAMES } from "@/lib/vocabulary/roles";

import { valueLines } from "./value-lines";

interface HistoryTableProps {
  rows: readonly ShownRow[];
  productCode: string;
}

/** Who did what and when, what it was and became, why, and whether it was done or refused. */
export function HistoryTable({ rows, productCode }: HistoryTableProps) {
  return (
    <Table caption="History, newest first" narrow="stack">
      <TableHead>
        <Head>When</Head>
        <Head>Who</Head>
        <Head>What</Head>
        <Head>Was</Head>
        <Head>Now</Head>
        <Head>Reason</Head>
        <Head>Outcome</Head>
      </TableHead>
      <tbody>
        {rows.map((row) => (
          <Row key={row.id} data-entry={row.sequence}>
            <RowHead label="When" className="whitespace-nowrap">
              <UtcTime at={row.at} />
              <span className="block font-code text-2xs text-ink-2" title={row.hash}>
                {row.sequence} · {row.hash.slice(0, 12)}
              </span>
            </RowHead>
            <Cell label="Who">
              {row.printedName}
              {row.capacity ? <span className="block text-xs text-ink-2">as {capacityName(row.capacity)}</span> : null}
            </Cell>
            <Cell label="What">
              {actName(row.act)}
              <span className="block text-xs text-ink-2">
                <SubjectName label={row.subjectLabel} productCode={productCode} />
              </span>
            </Cell>
            <Cell label="Was" className="text-sm">
              <Lines value={row.was} />
            </Cell>
            <Cell label="Now" className="text-sm">
              <Lines value={row.now} />
            </Cell>
            <Cell label="Reason" className="min-w-40 text-sm">
              {row.reason ?? ""}
            </Cell>
            <Cell label="Outcome" className={row.outcome === "refused" ? "font-semibold text-signal" : undefined}>
              {row.outcome}
              {row.times > 1 ? <span className="block text-xs">{row.times} times in a row</span> : null}
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

function Lines({ value }: { value: unknown }) {
  return valueLines(value).map((line, at) => (
    <span key={at} className="block max-w-64 break-words">
      {line.replace(/\b([0-9a-f]{12})[0-9a-f]{52}\b/g, "$1…")}
    </span>
  ));
}

/** The label of a proposal leads to it. */
function SubjectName({ label, productCode }: { label: string; productCode: string }) {
  const number = new RegExp(`^${productCode}-CP-0*(\\d+)$`).exec(label)?.[1];
  if (number === undefined) return label;

  return (
    <Link className="link" href={`/products/${productCode}/proposals/${number}` as Route}>
      {label}
    </Link>
  );
}

function actName(act: string): string {
  return Object.entries(ACT_NAMES).find(([key]) => key === act)?.[1] ?? act;
}

function capacityName(capacity: string): string {
  const name = Object.entries(ROLE_NAMES).find(([role]) => role === capacity)?.[1];
  return (name ?? capacity).toLowerCase();
}
