import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { RemarkFlag } from "@/app/_components/remark-flag";
import { RevisionLetter } from "@/app/_components/revision-letter";
import { type Reading, readChange, readChangeNumber } from "@/lib/evaluation/measures/reading";
import type { FieldChangeRow, LineChangeView, PersonView } from "@/lib/proposals/views";
import type { EditOperation } from "@/lib/vocabulary/lines";
import { LINE_KIND_NAMES } from "@/lib/vocabulary/lines";

import { FieldsThatStay } from "./fields-that-stay";
import { RemarkDialog } from "./remark-dialog";

const OPERATION_WORDS: Record<EditOperation, string> = {
  add: "added",
  revise: "revised",
  retire: "retired",
  reinstate: "reinstated",
};

const COLUMNS = 5;

interface ChangeTableProps {
  proposalId: number;
  line: LineChangeView;
  baseIssue: number;
  /** Of the worst operating point. */
  effectReading: Reading;
  mayRemark: boolean;
  people: readonly PersonView[];
}

/** One line of the change sheet: every field as it was and as it is to be, changed rows with a bar in the margin. */
export function ChangeTable({ proposalId, line, baseIssue, effectReading, mayRemark, people }: ChangeTableProps) {
  const added = line.operation === "add";
  // A field that somebody remarked on is at issue, changed or not.
  const isAtIssue = (row: FieldChangeRow) => row.changed || row.remarkNumbers.length > 0;
  const staying = line.rows.filter((row) => !isAtIssue(row));
  const fieldRow = (row: FieldChangeRow) => (
    <FieldRow
      key={row.field}
      proposalId={proposalId}
      line={line}
      row={row}
      reading={effectReading}
      mayRemark={mayRemark}
      people={people}
    />
  );

  return (
    <section className="mt-7" aria-label={`${line.number} ${line.name}, ${OPERATION_WORDS[line.operation]}`}>
      <LineHeading line={line} reading={effectReading} />
      <Table caption={`Fields of ${line.number} ${line.name}`} narrow="stack">
        <TableHead>
          <Head className="w-[27%]">Field</Head>
          <Head className="w-[29%]">{added ? "Was" : `Was, issue ${baseIssue}`}</Head>
          <Head className="w-[29%]">To be</Head>
          <Head numeric unit={effectReading.unit}>
            Effect
          </Head>
          <Head>
            <span className="sr-only">Remarks</span>
          </Head>
        </TableHead>
        <tbody>{line.rows.filter(isAtIssue).map(fieldRow)}</tbody>
        {staying.length > 0 ? (
          <FieldsThatStay count={staying.length} of={`${line.number} ${line.name}`} columns={COLUMNS}>
            {staying.map(fieldRow)}
          </FieldsThatStay>
        ) : null}
      </Table>
    </section>
  );
}

function LineHeading({ line, reading }: { line: LineChangeView; reading: Reading }) {
  return (
    <div className="mb-1 flex flex-wrap items-baseline gap-x-2.5 gap-y-1">
      <h2 className="text-lg">
        {line.kind === "item" ? "" : `${LINE_KIND_NAMES[line.kind]} `}
        {line.number} {line.name}
      </h2>
      {line.baseLetter ? (
        <>
          <RevisionLetter letter={line.baseLetter} /> <span className="font-semibold">becomes</span>
        </>
      ) : null}
      <RevisionLetter letter={line.nextLetter} />
      <span className="ml-auto text-sm text-ink-2">
        {OPERATION_WORDS[line.operation]}
        {line.effect === null ? "" : `, ${readChange(reading, line.effect)}`}
      </span>
    </div>
  );
}

interface FieldRowProps {
  proposalId: number;
  line: LineChangeView;
  row: FieldChangeRow;
  reading: Reading;
  mayRemark: boolean;
  people: readonly PersonView[];
}

function FieldRow({ proposalId, line, row, reading, mayRemark, people }: FieldRowProps) {
  // What stays as it is takes one line on a narrow screen, so that what changes is found.
  const wideOnly = row.changed ? "" : "max-sm:!hidden";

  return (
    <Row>
      <RowHead label="Field" className={`text-ink-2 ${row.changed ? "change-bar" : ""}`}>
        {row.label}
        {row.changed ? <span className="sr-only">, changed</span> : null}
      </RowHead>
      <Cell label="Was" className={`whitespace-pre-line text-ink-2 ${wideOnly}`}>
        <ValueText value={row.was} unit={row.unit} />
      </Cell>
      <Cell
        label={row.changed ? "To be" : "Stays"}
        className={`whitespace-pre-line ${row.changed ? "font-semibold" : ""}`}
      >
        <ValueText value={row.toBe} unit={row.unit} />
      </Cell>
      <Cell label="Effect" numeric className={`text-water ${wideOnly}`}>
        {row.effect === null ? "" : readChangeNumber(reading, row.effect)}
      </Cell>
      <Cell className="max-sm:!flex">
        <span className="flex flex-wrap items-center justify-end gap-1.5">
          {row.remarkNumbers.map((number) => (
            <a key={number} href={`#remark-${number}`} aria-label={`Remark ${number} on ${row.label}`}>
              <RemarkFlag>R{number}</RemarkFlag>
            </a>
          ))}
          {mayRemark ? (
            <RemarkDialog
              proposalId={proposalId}
              target={{ line: { kind: line.kind, number: line.number }, field: row.field }}
              title={`Remark on ${line.number} ${row.label}`}
              people={people}
              discreet
            />
          ) : null}
        </span>
      </Cell>
    </Row>
  );
}

function ValueText({ value, unit }: { value: string | null; unit: string | null }) {
  if (value === null || value === "") return <span aria-label="empty">–</span>;

  return (
    <>
      {value}
      {unit ? `\u2009${unit}` : ""}
    </>
  );
}
