import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { dayText } from "@/app/_components/utc-text";
import type { EvidenceCitation } from "@/lib/evaluation/lines/items/item-common";

import { evidenceAge } from "@/app/(workspace)/products/[productCode]/_sheet/evidence-age";

interface EvidenceTableProps {
  evidence: readonly EvidenceCitation[];
  /** Days after which evidence counts as old, by the terms. */
  ageDays: number;
  now: Date;
}

/** What the item rests on, and how old it is on the day it is read. */
export function EvidenceTable({ evidence, ageDays, now }: EvidenceTableProps) {
  if (evidence.length === 0) return <p className="text-ink-2">None cited; the grade estimated needs none.</p>;

  return (
    <Table caption="Evidence" narrow="stack">
      <TableHead>
        <Head>Document</Head>
        <Head>Revision</Head>
        <Head>Date</Head>
        <Head numeric>Age today</Head>
      </TableHead>
      <tbody>
        {evidence.map(({ document, revision, date }, at) => {
          const age = evidenceAge(date, now);
          return (
            <Row key={at}>
              <RowHead label="Document">{document}</RowHead>
              <Cell label="Revision">{revision}</Cell>
              <Cell label="Date">{dayText(date)}</Cell>
              <Cell numeric label="Age today">
                {age} days
                {age > ageDays ? (
                  <span className="block text-xs text-ink-2">▲ counts as old after {ageDays} days</span>
                ) : null}
              </Cell>
            </Row>
          );
        })}
      </tbody>
    </Table>
  );
}
