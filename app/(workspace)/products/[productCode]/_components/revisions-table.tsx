import type { Route } from "next";
import Link from "next/link";

import { RevisionLetter } from "@/app/_components/revision-letter";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { UtcTime } from "@/app/_components/utc-time";
import type { ComparedField, LineRevisionView } from "@/lib/budget/views";

import { approvedBy, proposedBy } from "./sheet-fields";

interface RevisionsTableProps {
  revisions: readonly LineRevisionView[];
  productCode: string;
}

/** Every letter of a line, as given newest first: why it moved, what changed, who proposed and who approved. */
export function RevisionsTable({ revisions, productCode }: RevisionsTableProps) {
  return (
    <Table caption="Revisions" narrow="stack">
      <TableHead>
        <Head>Rev</Head>
        <Head>Issue</Head>
        <Head>Why</Head>
        <Head>What changed</Head>
        <Head>Proposed, approved</Head>
      </TableHead>
      <tbody>
        {revisions.map(({ letter, retired, issue, fields }) => (
          <Row key={letter}>
            <RowHead label="Rev">
              <RevisionLetter letter={letter} />
              {retired ? <span className="ml-2 text-xs text-ink-2">retired</span> : null}
            </RowHead>
            <Cell label="Issue">
              {issue.number}
              <span className="block text-xs text-ink-2">
                <UtcTime at={issue.at} />
              </span>
            </Cell>
            <Cell label="Why">
              {issue.proposal ? (
                <Link className="link" href={`/products/${productCode}/proposals/${issue.proposal.number}` as Route}>
                  {issue.proposal.label} {issue.proposal.title}
                </Link>
              ) : (
                "established"
              )}
            </Cell>
            <Cell label="What changed">
              {letter === "–" ? <span className="text-ink-2">first issue</span> : <ChangedFields fields={fields} />}
            </Cell>
            <Cell label="By">
              {proposedBy(issue)}
              <span className="block text-xs text-ink-2">{approvedBy(issue)}</span>
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

/** "Length along the flow: 8.2 → 8.4 m". */
export function ChangedFields({ fields }: { fields: readonly ComparedField[] }) {
  if (fields.length === 0) return <span className="text-ink-2">no field</span>;

  return (
    <ul className="space-y-0.5">
      {fields.map(({ field, label, was, now, unit }) => (
        <li key={field}>
          <span className="text-ink-2">{label}:</span> {was ?? "–"} <span aria-hidden>→</span>
          <span className="sr-only">becomes</span> {now ?? "–"}
          {unit ? ` ${unit}` : ""}
        </li>
      ))}
    </ul>
  );
}
