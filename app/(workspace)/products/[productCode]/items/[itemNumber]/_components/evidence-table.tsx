import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { EvidenceCitation } from "@/lib/evaluation/lines/items/item-common";
import type { ItemFile } from "@/lib/proposals/reading/item-files";

import { AgeText } from "@/app/(workspace)/products/[productCode]/_evidence/age-text";
import { FileCell } from "@/app/(workspace)/products/[productCode]/_evidence/file-cell";

interface EvidenceTableProps {
  productCode: string;
  evidence: readonly EvidenceCitation[];
  files: readonly ItemFile[];
  /** Days after which evidence counts as old, by the terms. */
  ageDays: number;
  now: Date;
}

/** What the item rests on, and how old it is on the day it is read. */
export function EvidenceTable({ productCode, evidence, files, ageDays, now }: EvidenceTableProps) {
  if (evidence.length === 0) return <p className="text-ink-2">None cited; the grade estimated needs none.</p>;
  const fileOf = ({ file }: EvidenceCitation) => files.find((held) => held.file.sha256 === file?.sha256)?.file ?? null;

  return (
    <Table caption="Evidence" narrow="stack">
      <TableHead>
        <Head className="w-[30%]">Document</Head>
        <Head>Revision</Head>
        <Head>Date</Head>
        <Head className="w-[38%]">File</Head>
      </TableHead>
      <tbody>
        {evidence.map((citation, at) => (
          <Row key={at}>
            <RowHead label="Document">{citation.document}</RowHead>
            <Cell label="Revision">{citation.revision}</Cell>
            <Cell label="Date">
              <span>
                <AgeText date={citation.date} ageDays={ageDays} now={now} />
              </span>
            </Cell>
            <Cell label="File">
              <FileCell productCode={productCode} file={fileOf(citation)} citedName={citation.file?.name} />
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
