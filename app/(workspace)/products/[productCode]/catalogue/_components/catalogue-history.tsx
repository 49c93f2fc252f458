import type { Route } from "next";
import Link from "next/link";

import { RevisionLetter } from "@/app/_components/revision-letter";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { UtcTime } from "@/app/_components/utc-time";
import type { CatalogueChange, CatalogueVersion } from "@/lib/budget/catalogue-history";

import { ChangedFields } from "@/app/(workspace)/products/[productCode]/_components/revisions-table";
import { approvedBy, proposedBy } from "@/app/(workspace)/products/[productCode]/_components/sheet-fields";

interface CatalogueHistoryProps {
  versions: readonly CatalogueVersion[];
  productCode: string;
}

/** Each issue that touched a finish made the next version of the catalogue: what changed, why, and who signed. */
export function CatalogueHistory({ versions, productCode }: CatalogueHistoryProps) {
  if (versions.length === 0) return <p className="text-ink-2">No issue has brought a finish yet.</p>;

  return (
    <Table caption="Versions of the finish catalogue" narrow="stack">
      <TableHead>
        <Head>Version</Head>
        <Head>Issue</Head>
        <Head className="w-[42%]">What changed</Head>
        <Head>Why</Head>
        <Head>Proposed, signed</Head>
      </TableHead>
      <tbody>
        {versions.map(({ version, issue, inForce, changes }) => (
          <Row key={version} data-catalogue-version={version}>
            <RowHead label="Version">
              {version}
              <span className="block text-xs text-ink-2">{inForce} in force</span>
            </RowHead>
            <Cell label="Issue">
              <Link className="link" href={`/products/${productCode}/catalogue?issue=${issue.number}` as Route}>
                {issue.number}
              </Link>
              <span className="block text-xs text-ink-2">
                <UtcTime at={issue.at} />
              </span>
            </Cell>
            <Cell label="What changed">
              <Changes changes={changes} isFirst={version === 1} />
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

function Changes({ changes, isFirst }: { changes: readonly CatalogueChange[]; isFirst: boolean }) {
  if (isFirst)
    return <span className="text-ink-2">released with {changes.map(({ finish }) => finish).join(", ")}</span>;

  return (
    <ul className="space-y-1">
      {changes.map(({ finish, name, letterWas, letterNow, moved, fields }) => (
        <li key={finish}>
          {finish} {name} {letterWas === null ? null : <RevisionLetter letter={letterWas} />}{" "}
          {letterWas === null ? null : <span aria-hidden>→ </span>}
          <RevisionLetter letter={letterNow} />
          {letterWas === null ? " new" : null}
          {moved ? ` ${moved}` : null}
          {letterWas === null || (moved && fields.length === 0) ? null : <ChangedFields fields={fields} />}
        </li>
      ))}
    </ul>
  );
}
