import type { Route } from "next";
import Link from "next/link";

import { RevisionLetter } from "@/app/_components/revision-letter";
import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { LineRevisionView } from "@/lib/budget/views";
import type { ItemFile } from "@/lib/proposals/reading/item-files";

import { FileCell } from "@/app/(workspace)/products/[productCode]/_evidence/file-cell";

interface EarlierFilesProps {
  productCode: string;
  files: readonly ItemFile[];
  revisions: readonly LineRevisionView[];
}

/** Every file that the item ever cited, with the letter and the proposal by which it came: none is ever taken away. */
export function EarlierFiles({ productCode, files, revisions }: EarlierFilesProps) {
  if (files.length === 0) return null;

  return (
    <>
      <SectionHeading aside={files.length}>Files of all revisions</SectionHeading>
      <Table caption="Files of all revisions" narrow="stack">
        <TableHead>
          <Head className="w-[38%]">File</Head>
          <Head>Document, revision</Head>
          <Head>Cited by</Head>
          <Head>Came by</Head>
        </TableHead>
        <tbody>
          {files.map(({ file, document, revision, fromLetter, untilLetter }) => (
            <Row key={file.fileId}>
              <RowHead label="File">
                <FileCell productCode={productCode} file={file} />
              </RowHead>
              <Cell label="Document">
                {document}, {revision}
              </Cell>
              <Cell label="Cited by">
                <span>
                  <RevisionLetter letter={fromLetter} />
                  {untilLetter === fromLetter ? null : (
                    <>
                      {" "}
                      to <RevisionLetter letter={untilLetter} />
                    </>
                  )}
                </span>
              </Cell>
              <Cell label="Came by">
                <CameBy productCode={productCode} revision={revisions.find(({ letter }) => letter === fromLetter)} />
              </Cell>
            </Row>
          ))}
        </tbody>
      </Table>
    </>
  );
}

function CameBy({ productCode, revision }: { productCode: string; revision: LineRevisionView | undefined }) {
  const proposal = revision?.issue.proposal;
  if (!proposal) return <>–</>;

  return (
    <span>
      <Link className="link" href={`/products/${productCode}/proposals/${proposal.number}` as Route}>
        {proposal.label} {proposal.title}
      </Link>
      , issue {revision.issue.number}
    </span>
  );
}
