import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { CitedEvidenceView, FileView, ProposalView } from "@/lib/proposals/views";

import { AgeText } from "@/app/(workspace)/products/[productCode]/_evidence/age-text";
import { FileCell } from "@/app/(workspace)/products/[productCode]/_evidence/file-cell";
import { AddFileDialog } from "./add-file-dialog";

interface EvidenceSectionProps {
  proposal: ProposalView;
  now: Date;
}

/** What the edited items rest on, file by file, and what was added beside the proposal since it was submitted. */
export function EvidenceSection({ proposal, now }: EvidenceSectionProps) {
  const { evidence, moves, product, proposalId } = proposal;
  const { cited, beside, ageDays } = evidence;
  const mayAdd = moves.add_file.applies && moves.add_file.allowed;
  if (cited.length + beside.length === 0 && !mayAdd) return null;

  return (
    <section className="mt-7">
      <SectionHeading>Evidence</SectionHeading>
      {cited.length + beside.length === 0 ? (
        <p className="text-ink-2">No edited item cites a document.</p>
      ) : (
        <Table caption="Evidence" narrow="stack">
          <TableHead>
            <Head className="w-[24%]">For</Head>
            <Head className="w-[26%]">Document, revision</Head>
            <Head className="w-[18%]">Date</Head>
            <Head>File</Head>
          </TableHead>
          <tbody>
            {cited.map((citation, at) => (
              <CitedRow key={at} citation={citation} productCode={product.code} ageDays={ageDays} now={now} />
            ))}
            {beside.map((file) => (
              <BesideRow key={file.fileId} file={file} productCode={product.code} ageDays={ageDays} now={now} />
            ))}
          </tbody>
        </Table>
      )}
      {mayAdd ? (
        <div className="mt-3 print:hidden">
          <AddFileDialog productCode={product.code} proposalId={proposalId} />
        </div>
      ) : null}
    </section>
  );
}

interface RowProps {
  productCode: string;
  ageDays: number;
  now: Date;
}

function CitedRow({ citation, productCode, ...age }: RowProps & { citation: CitedEvidenceView }) {
  const { line, document, revision, date, isNew, file, fileName } = citation;

  return (
    <Row>
      <RowHead label="For" className={isNew ? "change-bar" : ""}>
        {line.number} {line.name}
        {isNew ? <span className="sr-only">, newly cited</span> : null}
      </RowHead>
      <Cell label="Document">
        {document}, {revision}
      </Cell>
      <Cell label="Date">
        <span>
          <AgeText date={date} {...age} />
        </span>
      </Cell>
      <Cell label="File">
        <FileCell productCode={productCode} file={file} citedName={fileName} />
      </Cell>
    </Row>
  );
}

function BesideRow({ file, productCode, ...age }: RowProps & { file: FileView }) {
  return (
    <Row>
      <RowHead label="For">the proposal</RowHead>
      <Cell label="Document">
        <span>
          Added beside it by {file.addedBy}
          <span className="block text-xs text-ink-2">no signature covers it</span>
        </span>
      </Cell>
      <Cell label="Date">
        <span>
          <AgeText date={file.sourceDate} {...age} />
        </span>
      </Cell>
      <Cell label="File">
        <FileCell productCode={productCode} file={file} />
      </Cell>
    </Row>
  );
}
